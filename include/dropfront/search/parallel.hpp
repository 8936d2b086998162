#pragma once
#include <functional>
#include <memory>

namespace dropfront::search {

/// A fixed number of threads for loops whose iterations do not touch each other: iteration i writes result i,
/// and the caller merges the results in order, so that the thread count cannot show in an answer.
class Workers {
 public:
  explicit Workers(int threads);  ///< <= 0: all cores
  ~Workers();
  void for_each(std::size_t count, std::size_t grain, const std::function<void(std::size_t)>& body);

 private:
  struct Arena;
  std::unique_ptr<Arena> arena_;
};

}  // namespace dropfront::search
