#pragma once
#include <set>
#include <utility>
#include <vector>

#include "dropfront/search/space.hpp"

namespace dropfront::search {

/// The best so many designs by a list of measures (compared in order), ties by choice. Content does not
/// depend on the order of arrival.
class Shortlist {
 public:
  using Entry = std::pair<std::vector<double>, Choice>;

  explicit Shortlist(std::size_t most) : most_(most) {}

  void offer(std::vector<double> measures, const Choice& choice) {
    if (entries_.size() == most_ && !(measures <= entries_.rbegin()->first)) return;
    entries_.emplace(std::move(measures), choice);
    if (entries_.size() > most_) entries_.erase(std::prev(entries_.end()));
  }

  const std::set<Entry>& entries() const { return entries_; }

 private:
  std::size_t most_;
  std::set<Entry> entries_;
};

}  // namespace dropfront::search
