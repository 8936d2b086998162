#pragma once
#include <cstdint>
#include <queue>
#include <vector>

#include "dropfront/search/choice_codec.hpp"
#include "dropfront/search/front_gauge.hpp"
#include "dropfront/search/pareto.hpp"

namespace dropfront::search {

/// Designs that were looked at and wait for their evaluation, most promising first. Packed: millions fit.
class CandidateQueue {
 public:
  CandidateQueue(const ChoiceCodec& codec, int objectives) : codec_(&codec), objectives_(objectives) {}

  /// `known`: objectives as the look told them, NaN where unknown; `predicted`: all of them, optimistic where
  /// unknown; `chance`: that the design holds its checks.
  void push(const Choice& choice, const std::vector<double>& known, const std::vector<double>& predicted,
            double chance, double gain);

  /// Takes up to `count` designs. Designs that the front rejects by what is known, or that are predicted to
  /// miss it by more than `reach`, fall out; the latter are counted in left_out().
  std::vector<Choice> pop(int count, const ParetoArchive& front, double reach);

  /// Counts a design that was not worth pushing.
  void leave_out() { ++left_out_; }

  bool empty() const { return heap_.empty(); }
  std::int64_t left_out() const { return left_out_; }
  /// Designs that promised to reach the front when they were pushed and still wait.
  std::int64_t promising() const { return promising_; }
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

  const ChoiceCodec* codec_;
  int objectives_;
  std::vector<std::uint64_t> choices_;
  std::vector<float> chances_;
  std::vector<double> known_, predicted_;
  std::priority_queue<Item> heap_;
  std::vector<Rejected> rejected_;
  std::int64_t left_out_ = 0;
  std::int64_t promising_ = 0;
};

}  // namespace dropfront::search
