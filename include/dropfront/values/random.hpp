#pragma once
#include <array>
#include <cstdint>

namespace dropfront::values {

/// One step of SplitMix64 (Steele, Lea, Flood 2014; public-domain reference by Vigna): advances `state`.
constexpr std::uint64_t splitmix64(std::uint64_t& state) {
  state += 0x9e3779b97f4a7c15ULL;
  std::uint64_t z = state;
  z = (z ^ (z >> 30)) * 0xbf58476d1ce4e5b9ULL;
  z = (z ^ (z >> 27)) * 0x94d049bb133111ebULL;
  return z ^ (z >> 31);
}

/// Deterministic stream, the same on every machine: xoshiro256** (Blackman, Vigna 2018). Never global: made
/// from a seed, split by index, passed by reference.
class RandomStream {
 public:
  using State = std::array<std::uint64_t, 4>;

  explicit constexpr RandomStream(std::uint64_t seed) : seed_(seed) {
    std::uint64_t s = seed;
    for (auto& word : state_) word = splitmix64(s);
  }
  /// From a whole state (not all zero): for tests against published outputs.
  explicit constexpr RandomStream(const State& state) : state_(state) {}

  constexpr std::uint64_t next() {
    const std::uint64_t result = rotate_left(state_[1] * 5, 7) * 9;
    const std::uint64_t t = state_[1] << 17;
    state_[2] ^= state_[0];
    state_[3] ^= state_[1];
    state_[1] ^= state_[2];
    state_[0] ^= state_[3];
    state_[2] ^= t;
    state_[3] = rotate_left(state_[3], 45);
    return result;
  }

  /// Uniform in [0, 1), 53 bits.
  constexpr double uniform01() { return static_cast<double>(next() >> 11) * 0x1p-53; }

  /// Uniform in [low, high).
  constexpr double uniform(double low, double high) { return low + (high - low) * uniform01(); }

  /// Uniform in 0 .. n-1, without bias; 0 for n = 0.
  constexpr std::uint64_t below(std::uint64_t n) {
    if (n == 0) return 0;
    const std::uint64_t reject_under = (0 - n) % n;  // 2^64 mod n: the incomplete round
    std::uint64_t x = next();
    while (x < reject_under) x = next();
    return x % n;
  }

  /// An independent stream for work item `index`: depends on the seed and the index alone, never on how much
  /// of this stream was drawn.
  constexpr RandomStream split(std::uint64_t index) const {
    std::uint64_t s = seed_;
    std::uint64_t t = splitmix64(s) ^ (index * 0xd1342543de82ef95ULL + 0x632be59bd9b4e019ULL);
    return RandomStream(splitmix64(t));
  }

 private:
  static constexpr std::uint64_t rotate_left(std::uint64_t x, int k) { return (x << k) | (x >> (64 - k)); }

  std::uint64_t seed_ = 0;
  State state_{};
};

}  // namespace dropfront::values
