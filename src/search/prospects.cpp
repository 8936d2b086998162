#include "dropfront/search/prospects.hpp"

#include <algorithm>
#include <utility>

namespace dropfront::search {
namespace {

constexpr std::size_t most_reguessed = 10000;
constexpr double least_reach = 0.05;
constexpr double all_of_it = 1e9;

}  // namespace

void Prospects::add(const std::vector<Parent>& parents, const std::vector<Choice>& choices,
                    const std::vector<std::size_t>& made_from) {
  std::vector<std::size_t> places;
  for (const Parent& parent : parents) {
    if (parent.tag >= 0) {
      const auto entry = place_of_.try_emplace(parent.tag, parents_.size());
      places.push_back(entry.first->second);
      if (!entry.second) continue;
    } else {
      places.push_back(parents_.size());
    }
    parents_.push_back(parent);
  }
  std::vector<Offspring> offspring;
  for (Looked& looked : state_.look_new(choices))
    offspring.push_back(
        Offspring{std::move(looked.choice), std::move(looked.objectives), places[made_from[looked.origin]]});
  const std::vector<Guess> guesses = Prospector(state_, parents_).guess(offspring);
  for (std::size_t i = 0; i < offspring.size(); ++i) {
    queue_.push(offspring[i].choice, offspring[i].known, static_cast<std::uint32_t>(offspring[i].parent),
                guesses[i], state_.plan.reach);
  }
}

void Prospects::reguess(std::size_t most) {
  std::vector<Offspring> offspring;
  for (CandidateQueue::Waiting& waiting : queue_.waiting(most))
    offspring.push_back(Offspring{std::move(waiting.choice), std::move(waiting.known), waiting.origin});
  queue_.reguess(Prospector(state_, parents_).guess(offspring), state_.plan.reach);
  guessed_at_ = state_.evaluations();
}

bool Prospects::recall() {
  while (queue_.aside() > 0) {
    // Guesses that have not changed will not be better: then more is taken.
    if (state_.evaluations() == recalled_at_) {
      if (state_.plan.reach >= all_of_it) return false;
      state_.plan.reach = state_.plan.reach < 1 ? std::max(2 * state_.plan.reach, least_reach) : all_of_it;
    }
    recalled_at_ = state_.evaluations();
    queue_.recall();
    reguess(queue_.size());
    if (!queue_.empty()) return true;
  }
  return false;
}

std::vector<Choice> Prospects::take(int count) {
  if (4 * state_.evaluations() > 5 * guessed_at_ + 4 * evaluation_batch) reguess(most_reguessed);
  auto choices = queue_.pop(count, state_.ledger.front(), state_.gauge(), state_.plan.reach);
  for (const auto& rejected : queue_.take_rejected())
    state_.ledger.pass_over(rejected.choice, rejected.objectives);
  return choices;
}

}  // namespace dropfront::search
