#include "dropfront/search/elites.hpp"

#include <algorithm>
#include <iterator>

namespace dropfront::search {

void Elites::add(std::int64_t region, const std::vector<double>& objectives, const Choice& choice,
                 std::int64_t tag) {
  Region& home = regions_.try_emplace(region, Region{ParetoArchive(resolution_), {}}).first->second;
  std::vector<std::int64_t> removed;
  if (!home.front.insert(objectives, choice, tag, &removed)) return;
  for (std::int64_t gone : removed) home.tags.erase(std::find(home.tags.begin(), home.tags.end(), gone));
  home.tags.push_back(tag);
}

std::int64_t Elites::draw(values::RandomStream& random) const {
  const auto region = std::next(regions_.begin(), static_cast<std::ptrdiff_t>(random.below(regions_.size())));
  return region->second.tags[random.below(region->second.tags.size())];
}

}  // namespace dropfront::search
