#pragma once
#include <cstdint>
#include <vector>

#include "dropfront/search/space.hpp"

namespace dropfront::search {

/// The Pareto front seen so far, at a resolution.
///
/// Dominance is exact on the keys of objective_key.hpp. Of designs with equal keys one is kept: the one with
/// the least raw objectives in the problem's order, then the least choice (slot order). The final content
/// therefore does not depend on the order of insertion.
///
/// Members lie in a k-d tree whose nodes know the least and greatest key of each objective, so that a
/// question touches few of them. Reading from several threads at once is safe while nobody inserts.
class ParetoArchive {
 public:
  struct Member {
    std::vector<double> keys;
    std::vector<double> objectives;
    Choice choice;
    std::int64_t tag = 0;  ///< the caller's own number
    bool alive = true;
  };

  /// `resolution`: one step an objective, 0 for raw values.
  explicit ParetoArchive(std::vector<double> resolution);

  /// Enters a design; false when the front has no place for it. `removed` (may be null) receives the tags of
  /// the members it displaces. An objective that is NaN has no place on a front.
  bool insert(const std::vector<double>& objectives, const Choice& choice, std::int64_t tag,
              std::vector<std::int64_t>* removed = nullptr);

  /// True when no completion of a partly known vector could enter. NaN means unknown and is taken as the best
  /// value possible, so any unknown objective makes the answer false; a lower bound may stand for a value.
  /// `choice` settles equal raw vectors (the smaller choice stays).
  bool rejects(const std::vector<double>& objectives, const Choice& choice) const;

  /// The least value of objective k beyond which the front surely rejects a vector that is `bound` in the
  /// others (-infinity: unknown, as good as can be): a step worse than the best member in k among those no
  /// worse in all others. +infinity: it never does.
  double surely_rejected_from(const std::vector<double>& bound, int k) const;

  int size() const { return alive_; }
  std::vector<std::int64_t> tags() const;  ///< of the members, in order of entry
  std::vector<std::int64_t> ends() const;  ///< for each objective the tag of the member best in it
  const std::vector<double>& resolution() const { return resolution_; }

  /// Members in order of raw objectives, then choice.
  std::vector<const Member*> sorted() const;

  /// Every member ever entered, in order of entry; those with alive = false have been displaced.
  const std::vector<Member>& entries() const { return members_; }

 private:
  struct Node {
    int left = -1;
    int right = -1;  ///< both -1: a leaf
    int dimension = 0;
    double split = 0;
    std::vector<int> members;
    std::vector<double> low, high;
  };

  bool node_rejects(int node, const Member& query) const;
  void least_beyond(int node, const std::vector<double>& keys, int k, double& least) const;
  void remove_dominated(int node, const Member& newcomer, std::vector<std::int64_t>* removed);
  void place(int member);
  void split_leaf(int node, int depth);
  void refresh(Node& node) const;

  std::vector<double> resolution_;
  std::vector<Member> members_;
  std::vector<Node> nodes_;
  int alive_ = 0;
};

}  // namespace dropfront::search
