#pragma once
#include <map>
#include <string>
#include <vector>

#include "dropfront/problem/problem.hpp"
#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// The offered parts of a problem grouped by slot and electrical values.
class SecondSources {
 public:
  explicit SecondSources(const problem::Problem& problem);

  /// For each slot of `design`, the other offered parts with equal electrical values that are neither cheaper
  /// at the problem's volume nor smaller. Slots without any are left out.
  std::vector<Entry::Alternative> of(const scoring::Design& design) const;

 private:
  template <typename Part>
  void offer(const std::string& slot, const Part* part);

  std::int64_t volume_ = 1;
  std::map<std::string, std::vector<const parts::PartInfo*>> groups_;
};

}  // namespace dropfront::report
