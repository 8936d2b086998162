#pragma once
#include <cstdint>
#include <vector>

#include "dropfront/search/space.hpp"

namespace dropfront::search {

/// Choices as mixed-radix numbers of a fixed count of 64-bit words: one word up to 1.8e19 designs, more
/// beyond.
class ChoiceCodec {
 public:
  explicit ChoiceCodec(const Space& space);
  int words() const { return words_; }
  /// Writes words() numbers to `out`. `choice` must lie in the space.
  void encode(const Choice& choice, std::uint64_t* out) const;
  Choice decode(const std::uint64_t* in) const;

 private:
  struct Place {
    int word;
    std::uint64_t weight;
    std::uint64_t size;
  };
  std::vector<Place> places_;
  int words_ = 1;
};

/// Set of choices already looked at. Open addressing over packed words; about 16 bytes an entry.
class ChoiceSet {
 public:
  explicit ChoiceSet(const ChoiceCodec& codec);
  /// True when the choice is new (and now held).
  bool insert(const Choice& choice);
  /// Safe from several threads at once while nobody inserts.
  bool contains(const Choice& choice) const;
  std::int64_t size() const { return size_; }

 private:
  void grow();
  std::size_t find(const std::uint64_t* key) const;

  const ChoiceCodec* codec_;
  std::size_t stride_;
  std::vector<std::uint64_t> slots_;  ///< stride_ words an entry; first word all ones: empty
  std::size_t mask_;
  std::int64_t size_ = 0;
  std::vector<std::uint64_t> key_;
};

}  // namespace dropfront::search
