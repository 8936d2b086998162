#include "dropfront/search/candidate_queue.hpp"

#include <algorithm>
#include <utility>

namespace dropfront::search {

Choice CandidateQueue::choice_at(std::size_t index) const {
  return codec_->decode(&choices_[index * codec_->words()]);
}

std::vector<double> CandidateQueue::row(const std::vector<double>& table, std::size_t index) const {
  const auto begin = table.begin() + static_cast<std::ptrdiff_t>(index * objectives_);
  return {begin, begin + objectives_};
}

void CandidateQueue::add(Item item) {
  if (item.promise > 0) ++promising_;
  heap_.push_back(item);
  std::push_heap(heap_.begin(), heap_.end());
}

CandidateQueue::Item CandidateQueue::take() {
  std::pop_heap(heap_.begin(), heap_.end());
  const Item item = heap_.back();
  heap_.pop_back();
  if (item.promise > 0) --promising_;
  return item;
}

void CandidateQueue::push(const Choice& choice, const std::vector<double>& known, std::uint32_t origin,
                          const Guess& guess, double reach) {
  const std::size_t index = chances_.size();
  choices_.resize((index + 1) * codec_->words());
  codec_->encode(choice, &choices_[index * codec_->words()]);
  origins_.push_back(origin);
  chances_.push_back(static_cast<float>(guess.chance));
  known_.insert(known_.end(), known.begin(), known.end());
  guessed_.insert(guessed_.end(), guess.objectives.begin(), guess.objectives.end());
  if (guess.gain <= -reach)
    aside_.push_back(static_cast<std::uint32_t>(index));
  else
    add(Item{promise(guess.gain, guess.chance), static_cast<std::uint32_t>(index)});
}

std::vector<Choice> CandidateQueue::pop(int count, const ParetoArchive& front, const FrontGauge& gauge,
                                        double reach) {
  std::vector<Choice> result;
  while (static_cast<int>(result.size()) < count && !heap_.empty()) {
    const Item item = take();
    Choice choice = choice_at(item.index);
    std::vector<double> known = row(known_, item.index);
    if (front.rejects(known, choice)) {
      rejected_.push_back(Rejected{std::move(choice), std::move(known)});
      continue;
    }
    const double gain = gauge.gain(row(guessed_, item.index), -reach);
    if (gain <= -reach && front.size() > 0) {
      aside_.push_back(item.index);
      continue;
    }
    // The front has moved on since the guess: a gain can only have shrunk. What has fallen behind the next in
    // line goes back to wait.
    const double now = promise(std::min(gain, 1.0), chances_[item.index]);
    if (now < item.promise && !heap_.empty() && now < heap_.front().promise)
      add(Item{now, item.index});
    else
      result.push_back(std::move(choice));
  }
  return result;
}

std::vector<CandidateQueue::Waiting> CandidateQueue::waiting(std::size_t most) {
  const std::size_t count = std::min(most, heap_.size());
  // Sorted best first, the array is no heap until reguess() has put it in order again.
  std::sort(heap_.begin(), heap_.end(), [](const Item& a, const Item& b) { return b < a; });
  std::vector<Waiting> result;
  for (std::size_t i = 0; i < count; ++i) {
    const std::size_t index = heap_[i].index;
    result.push_back(Waiting{choice_at(index), row(known_, index), origins_[index]});
  }
  return result;
}

void CandidateQueue::reguess(const std::vector<Guess>& guesses, double reach) {
  const std::vector<Item> old = std::exchange(heap_, {});
  promising_ = 0;
  for (std::size_t i = 0; i < old.size(); ++i) {
    const std::size_t index = old[i].index;
    if (i >= guesses.size()) {
      add(old[i]);
    } else if (guesses[i].gain <= -reach) {
      aside_.push_back(old[i].index);
    } else {
      chances_[index] = static_cast<float>(guesses[i].chance);
      std::copy(guesses[i].objectives.begin(), guesses[i].objectives.end(),
                guessed_.begin() + static_cast<std::ptrdiff_t>(index * objectives_));
      add(Item{promise(guesses[i].gain, guesses[i].chance), old[i].index});
    }
  }
}

void CandidateQueue::recall() {
  for (std::uint32_t index : std::exchange(aside_, {})) add(Item{0, index});
}

std::vector<CandidateQueue::Rejected> CandidateQueue::take_rejected() { return std::exchange(rejected_, {}); }

}  // namespace dropfront::search
