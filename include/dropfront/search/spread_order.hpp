#pragma once
#include <cstdint>
#include <map>
#include <vector>

namespace dropfront::search {

/// The order in which front members are taken up, so that a run cut off at any time has worked everywhere:
/// the best by each objective first, then each time the member farthest from all taken so far (distance as
/// the greatest difference over the objectives, each as a share of the front's extent; ties: least tag).
class SpreadOrder {
 public:
  explicit SpreadOrder(int objectives) : objectives_(objectives) {}

  void add(std::int64_t tag, const std::vector<double>& objectives);
  void remove(std::int64_t tag);
  bool empty() const { return waiting_ == 0; }
  /// Takes the next member; -1 when none waits.
  std::int64_t pick();

 private:
  struct Member {
    std::vector<double> objectives;
    double isolation = 0;  ///< distance to the nearest taken one, in current extents
    bool taken = false;
  };
  void rescale();
  double distance(const std::vector<double>& a, const std::vector<double>& b) const;

  int objectives_;
  std::map<std::int64_t, Member> members_;
  std::vector<std::vector<double>> taken_;  ///< displaced members included
  std::vector<double> extent_;
  std::int64_t waiting_ = 0;
};

}  // namespace dropfront::search
