#include "dropfront/search/parallel.hpp"

#include <oneapi/tbb/global_control.h>
#include <oneapi/tbb/info.h>
#include <oneapi/tbb/parallel_for.h>
#include <oneapi/tbb/task_arena.h>

#include <algorithm>

namespace dropfront::search {

struct Workers::Arena {
  explicit Arena(int threads)
      : allowance(oneapi::tbb::global_control::max_allowed_parallelism, static_cast<std::size_t>(threads)),
        arena(threads) {}
  oneapi::tbb::global_control allowance;
  oneapi::tbb::task_arena arena;
};

Workers::Workers(int threads)
    : arena_(std::make_unique<Arena>(threads > 0 ? threads
                                                 : std::max(1, oneapi::tbb::info::default_concurrency()))) {}

Workers::~Workers() = default;

void Workers::for_each(std::size_t count, std::size_t grain, const std::function<void(std::size_t)>& body) {
  using Range = oneapi::tbb::blocked_range<std::size_t>;
  arena_->arena.execute([&] {
    oneapi::tbb::parallel_for(Range(0, count, grain), [&body](const Range& range) {
      for (std::size_t i = range.begin(); i != range.end(); ++i) body(i);
    });
  });
}

}  // namespace dropfront::search
