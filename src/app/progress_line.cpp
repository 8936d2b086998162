#include "dropfront/app/progress_line.hpp"

#include <fmt/core.h>

#include "dropfront/report/for_people.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::app {

namespace {

using std::chrono::milliseconds;
constexpr milliseconds kSilence{1000};  ///< nothing is shown for what is over within it
constexpr milliseconds kPause{100};     ///< between two updates
constexpr int kWidth = 79;

}  // namespace

ProgressLine::ProgressLine(std::ostream& err, bool enabled, std::string name)
    : err_(err),
      enabled_(enabled),
      name_(std::move(name)),
      start_(std::chrono::steady_clock::now()),
      last_(start_) {}

ProgressLine::~ProgressLine() {
  if (shown_) err_ << "\r\x1b[K" << std::flush;
}

void ProgressLine::show(const search::Progress& progress) {
  if (!enabled_) return;
  const auto now = std::chrono::steady_clock::now();
  if (now - start_ < kSilence || (shown_ && now - last_ < kPause)) return;
  last_ = now;
  shown_ = true;
  const auto count = [](std::int64_t n) { return report::counted(static_cast<double>(n)); };
  err_ << "\r\x1b[K"
       << report::clipped(fmt::format("{}: {} {:.0f} %, {} looked at, {} scored, front {}", name_,
                                      progress.stage, 100 * progress.fraction, count(progress.looked),
                                      count(progress.scored), count(progress.front)),
                          kWidth)
       << std::flush;
}

}  // namespace dropfront::app
