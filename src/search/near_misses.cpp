#include "dropfront/search/near_misses.hpp"

namespace dropfront::search {

NearMisses::NearMisses(int checks) : checks_(checks) {}

void NearMisses::suggest(const Choice& choice, const Evaluation& evaluation) {
  if (evaluation.broken.size() != 1 || evaluation.outcome != Outcome::breaks_limits) return;
  PerCheck& check = checks_[evaluation.broken[0]];
  (evaluation.complete ? check.sure : check.open).offer({evaluation.shortfall[0]}, choice);
}

std::vector<Choice> NearMisses::unsettled(int a_check) const {
  std::vector<Choice> result;
  for (const PerCheck& check : checks_) {
    int asked = 0;
    for (const auto& entry : check.open.entries()) {
      const auto& sure = check.sure.entries();
      if (sure.size() == kept && *sure.rbegin() < entry) break;
      if (check.settled.count(entry.second)) continue;
      if (asked++ == a_check) break;
      result.push_back(entry.second);
    }
  }
  return result;
}

void NearMisses::settle(const Choice& choice, const Evaluation& full) {
  for (PerCheck& check : checks_)
    for (const auto& entry : check.open.entries())
      if (entry.second == choice) check.settled.insert(choice);
  if (full.complete) suggest(choice, full);
}

std::vector<NearMiss> NearMisses::result() const {
  std::vector<NearMiss> result;
  for (std::size_t c = 0; c < checks_.size(); ++c)
    for (const auto& entry : checks_[c].sure.entries()) {
      NearMiss miss;
      miss.choice = entry.second;
      miss.check = static_cast<int>(c);
      miss.shortfall = entry.first[0];
      result.push_back(miss);
    }
  return result;
}

}  // namespace dropfront::search
