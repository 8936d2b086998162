#include "dropfront/search/choice_codec.hpp"

#include <algorithm>
#include <limits>

namespace dropfront::search {
namespace {

constexpr std::uint64_t empty_slot = std::numeric_limits<std::uint64_t>::max();

std::uint64_t mix(std::uint64_t h) {
  // Finaliser of the splitmix64 generator.
  h += 0x9e3779b97f4a7c15u;
  h = (h ^ (h >> 30)) * 0xbf58476d1ce4e5b9u;
  h = (h ^ (h >> 27)) * 0x94d049bb133111ebu;
  return h ^ (h >> 31);
}

}  // namespace

ChoiceCodec::ChoiceCodec(const Space& space) {
  int word = 0;
  std::uint64_t weight = 1;
  // One below the top keeps the all-ones word free as a mark.
  const std::uint64_t most = empty_slot - 1;
  for (const Slot& slot : space.slots) {
    const std::uint64_t size = static_cast<std::uint64_t>(std::max(slot.size, 1));
    if (weight > most / size) {
      ++word;
      weight = 1;
    }
    places_.push_back(Place{word, weight, size});
    weight *= size;
  }
  words_ = word + 1;
}

void ChoiceCodec::encode(const Choice& choice, std::uint64_t* out) const {
  std::fill(out, out + words_, 0);
  for (std::size_t s = 0; s < places_.size(); ++s)
    out[places_[s].word] += places_[s].weight * static_cast<std::uint64_t>(choice[s]);
}

Choice ChoiceCodec::decode(const std::uint64_t* in) const {
  Choice choice(places_.size());
  for (std::size_t s = 0; s < places_.size(); ++s) {
    const std::uint64_t digit = in[places_[s].word] / places_[s].weight % places_[s].size;
    choice[s] = static_cast<std::int32_t>(digit);
  }
  return choice;
}

ChoiceSet::ChoiceSet(const ChoiceCodec& codec)
    : codec_(&codec),
      stride_(codec.words()),
      slots_(1024 * stride_, empty_slot),
      mask_(1023),
      key_(stride_) {}

std::size_t ChoiceSet::find(const std::uint64_t* key) const {
  std::uint64_t h = 0;
  for (std::size_t w = 0; w < stride_; ++w) h = mix(h ^ key[w]);
  std::size_t i = h & mask_;
  while (slots_[i * stride_] != empty_slot && !std::equal(key, key + stride_, &slots_[i * stride_]))
    i = (i + 1) & mask_;
  return i;
}

void ChoiceSet::grow() {
  std::vector<std::uint64_t> old((mask_ + 1) * 2 * stride_, empty_slot);
  old.swap(slots_);
  mask_ = mask_ * 2 + 1;
  for (std::size_t i = 0; i < old.size(); i += stride_)
    if (old[i] != empty_slot) std::copy_n(&old[i], stride_, &slots_[find(&old[i]) * stride_]);
}

bool ChoiceSet::insert(const Choice& choice) {
  if (static_cast<std::size_t>(size_) * 10 > (mask_ + 1) * 7) grow();
  codec_->encode(choice, key_.data());
  const std::size_t i = find(key_.data());
  if (slots_[i * stride_] != empty_slot) return false;
  std::copy_n(key_.data(), stride_, &slots_[i * stride_]);
  ++size_;
  return true;
}

bool ChoiceSet::contains(const Choice& choice) const {
  std::vector<std::uint64_t> key(stride_);
  codec_->encode(choice, key.data());
  return slots_[find(key.data()) * stride_] != empty_slot;
}

}  // namespace dropfront::search
