#include "dropfront/search/candidate_queue.hpp"

#include <algorithm>
#include <utility>

namespace dropfront::search {

void CandidateQueue::push(const Choice& choice, const std::vector<double>& known,
                          const std::vector<double>& predicted, double chance, double gain) {
  const std::size_t index = chances_.size();
  choices_.resize((index + 1) * codec_->words());
  codec_->encode(choice, &choices_[index * codec_->words()]);
  chances_.push_back(static_cast<float>(chance));
  known_.insert(known_.end(), known.begin(), known.end());
  predicted_.insert(predicted_.end(), predicted.begin(), predicted.end());
  heap_.push(Item{promise(gain, chance), static_cast<std::uint32_t>(index)});
  if (gain > 0) ++promising_;
}

std::vector<Choice> CandidateQueue::pop(int count, const ParetoArchive& front, double reach) {
  std::vector<Choice> result;
  const FrontGauge gauge(front);
  std::vector<double> known(objectives_), predicted(objectives_);
  while (static_cast<int>(result.size()) < count && !heap_.empty()) {
    const Item item = heap_.top();
    heap_.pop();
    if (item.promise > 0) --promising_;
    for (int k = 0; k < objectives_; ++k) {
      known[k] = known_[item.index * objectives_ + k];
      predicted[k] = predicted_[item.index * objectives_ + k];
    }
    Choice choice = codec_->decode(&choices_[item.index * codec_->words()]);
    if (front.rejects(known, choice)) {
      rejected_.push_back(Rejected{std::move(choice), known});
      continue;
    }
    // The front has moved on since the design was pushed: a gain can only have shrunk. What has fallen behind
    // the next in line goes back to wait.
    const double gain = gauge.gain(predicted, -reach);
    if (gain <= -reach && front.size() > 0) {
      ++left_out_;
      continue;
    }
    const double now = promise(std::min(gain, 1.0), chances_[item.index]);
    if (now < item.promise && !heap_.empty() && now < heap_.top().promise) {
      heap_.push(Item{now, item.index});
      if (now > 0) ++promising_;
      continue;
    }
    result.push_back(std::move(choice));
  }
  return result;
}

std::vector<CandidateQueue::Rejected> CandidateQueue::take_rejected() { return std::exchange(rejected_, {}); }

}  // namespace dropfront::search
