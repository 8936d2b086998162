#pragma once
#include <cstdint>
#include <map>
#include <vector>

#include "dropfront/search/pareto.hpp"
#include "dropfront/values/random.hpp"

namespace dropfront::search {

/// The front of every region by itself. A region that cannot compete yet keeps its best designs here, as
/// stock for mixtures, so that the search does not settle in the region that happened to be refined first.
class Elites {
 public:
  explicit Elites(std::vector<double> resolution) : resolution_(std::move(resolution)) {}

  void add(std::int64_t region, const std::vector<double>& objectives, const Choice& choice,
           std::int64_t tag);
  bool empty() const { return regions_.empty(); }
  /// A member of a region, both drawn evenly. Not to be called while empty.
  std::int64_t draw(values::RandomStream& random) const;

 private:
  struct Region {
    ParetoArchive front;
    std::vector<std::int64_t> tags;  ///< of the members, in order of entry
  };
  std::vector<double> resolution_;
  std::map<std::int64_t, Region> regions_;
};

}  // namespace dropfront::search
