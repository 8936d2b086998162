#pragma once
#include <cstdint>
#include <vector>

#include "dropfront/search/choice_codec.hpp"
#include "dropfront/search/front_gauge.hpp"
#include "dropfront/search/pareto.hpp"

namespace dropfront::search {

/// What is guessed of a design before its evaluation.
struct Guess {
  std::vector<double> objectives;  ///< known ones as they are, the others optimistic
  double chance = 0;               ///< that it holds its checks
  double gain = 0;                 ///< on the front, see FrontGauge
};

/// Designs that were looked at and wait for their evaluation, most promising first. Packed: millions fit.
class CandidateQueue {
 public:
  CandidateQueue(const ChoiceCodec& codec, int objectives) : codec_(&codec), objectives_(objectives) {}

  /// `known`: objectives as the look told them, NaN where unknown; `origin`: the caller's own number.
  void push(const Choice& choice, const std::vector<double>& known, std::uint32_t origin, const Guess& guess,
            double reach);
  std::size_t size() const { return heap_.size(); }

  /// Takes up to `count` designs. Designs that the front rejects by what is known fall out; those that are
  /// guessed to miss it by `reach` or more are laid aside.
  std::vector<Choice> pop(int count, const ParetoArchive& front, const FrontGauge& gauge, double reach);

  bool empty() const { return heap_.empty(); }
  /// Designs laid aside.
  std::size_t aside() const { return aside_.size(); }
  /// Takes all designs laid aside back among the waiting, to be guessed at anew.
  void recall();
  /// Designs that promised to reach the front when they were last guessed at and still wait.
  std::int64_t promising() const { return promising_; }

  /// A waiting design, to guess anew.
  struct Waiting {
    Choice choice;
    std::vector<double> known;
    std::uint32_t origin;
  };
  /// The most promising designs, up to `most`, in a fixed order.
  std::vector<Waiting> waiting(std::size_t most);
  /// New guesses for the designs that waiting() just gave, in its order; those that miss by `reach` are
  /// laid aside.
  void reguess(const std::vector<Guess>& guesses, double reach);

  /// Designs the front rejected while they waited, for the ledger's filling list.
  struct Rejected {
    Choice choice;
    std::vector<double> objectives;
  };
  std::vector<Rejected> take_rejected();

 private:
  struct Item {
    double promise;
    std::uint32_t index;
    bool operator<(const Item& other) const {
      return promise != other.promise ? promise < other.promise : index > other.index;
    }
  };
  static double promise(double gain, double chance) { return gain > 0 ? gain * chance : gain / chance; }
  Choice choice_at(std::size_t index) const;
  std::vector<double> row(const std::vector<double>& table, std::size_t index) const;
  void add(Item item);
  Item take();

  const ChoiceCodec* codec_;
  int objectives_;
  std::vector<std::uint64_t> choices_;
  std::vector<std::uint32_t> origins_;
  std::vector<float> chances_;
  std::vector<double> known_, guessed_;
  std::vector<Item> heap_;
  std::vector<Rejected> rejected_;
  std::vector<std::uint32_t> aside_;
  std::int64_t promising_ = 0;
};

}  // namespace dropfront::search
