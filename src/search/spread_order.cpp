#include "dropfront/search/spread_order.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "dropfront/search/achievement.hpp"

namespace dropfront::search {

double SpreadOrder::distance(const std::vector<double>& a, const std::vector<double>& b) const {
  double most = 0;
  for (int k = 0; k < objectives_; ++k) most = std::max(most, std::abs(a[k] - b[k]) / extent_[k]);
  return most;
}

void SpreadOrder::add(std::int64_t tag, const std::vector<double>& objectives) {
  Member member;
  member.objectives = objectives;
  member.isolation = std::numeric_limits<double>::infinity();
  if (!extent_.empty())
    for (const auto& other : taken_)
      member.isolation = std::min(member.isolation, distance(objectives, other));
  members_[tag] = std::move(member);
  ++waiting_;
}

void SpreadOrder::remove(std::int64_t tag) {
  const auto found = members_.find(tag);
  if (found == members_.end()) return;
  if (!found->second.taken) --waiting_;
  members_.erase(found);
}

// The front's extent changes as it grows; distances are measured anew once it has by a quarter.
void SpreadOrder::rescale() {
  ObjectiveRange range(objectives_);
  for (const auto& entry : members_) range.take(entry.second.objectives);
  bool changed = extent_.empty();
  for (int k = 0; k < objectives_ && !changed; ++k)
    changed = !(range.extent(k) <= 1.25 * extent_[k] && extent_[k] <= 1.25 * range.extent(k));
  if (!changed) return;
  extent_.resize(objectives_);
  for (int k = 0; k < objectives_; ++k) extent_[k] = range.extent(k);
  for (auto& entry : members_) {
    Member& member = entry.second;
    member.isolation = std::numeric_limits<double>::infinity();
    if (member.taken) continue;
    for (const auto& other : taken_)
      member.isolation = std::min(member.isolation, distance(member.objectives, other));
  }
}

std::int64_t SpreadOrder::pick() {
  if (empty()) return -1;
  rescale();
  auto chosen = members_.end();
  for (int k = 0; k < objectives_ && chosen == members_.end(); ++k) {
    const auto least = std::min_element(members_.begin(), members_.end(), [k](const auto& a, const auto& b) {
      return a.second.objectives[k] < b.second.objectives[k];
    });
    if (!least->second.taken) chosen = least;
  }
  if (chosen == members_.end())
    for (auto it = members_.begin(); it != members_.end(); ++it) {
      if (it->second.taken) continue;
      if (chosen == members_.end() || it->second.isolation > chosen->second.isolation) chosen = it;
    }
  chosen->second.taken = true;
  --waiting_;
  taken_.push_back(chosen->second.objectives);
  for (auto& entry : members_)
    if (!entry.second.taken)
      entry.second.isolation =
          std::min(entry.second.isolation, distance(entry.second.objectives, taken_.back()));
  return chosen->first;
}

}  // namespace dropfront::search
