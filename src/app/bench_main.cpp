// dropfront_bench: medians of what the tool spends its time on. A benchmark, not a test.
#include <fmt/core.h>

#include <algorithm>
#include <chrono>
#include <cstdio>
#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <functional>
#include <string>
#include <vector>

#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/circuit/available_current.hpp"
#include "dropfront/problem/binding.hpp"
#include "dropfront/report/deck.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/score.hpp"
#include "dropfront/search/search.hpp"

namespace {

using namespace dropfront;
using Clock = std::chrono::steady_clock;

struct Figure {
  double median = 0;
  int count = 0;
};

/// Median of `runs` timings of `work`, each repeated `batch` times, in seconds for one.
Figure timed(int runs, int batch, const std::function<void()>& work) {
  std::vector<double> seconds;
  work();
  for (int r = 0; r < runs; ++r) {
    const auto begin = Clock::now();
    for (int k = 0; k < batch; ++k) work();
    seconds.push_back(std::chrono::duration<double>(Clock::now() - begin).count() / batch);
  }
  std::sort(seconds.begin(), seconds.end());
  return {seconds[seconds.size() / 2], runs};
}

std::string json(const Figure& figure, double unit) {
  return fmt::format(R"({{"median": {:.4g}, "count": {}}})", figure.median * unit, figure.count);
}

/// The shipped timer's board at its nominal values under its heaviest load: an ordinary supply.
struct Board {
  circuit::ElementValues values;
  double required_rail_V = 0;
};

Board shipped_board() {
  auto file = problem::read_problem_file("problems/towel-rail-timer.json");
  problem::Problem& timer = file.problems.front();
  const auto design = problem::read_design_file("problems/designs/towel-rail-timer.json", timer);
  scoring::Evidence evidence(design, timer.requirement, timer.requirement.supplies.front());
  return {evidence.nominal().values, evidence.required_rail_V()};
}

/// One simulator run from a cold start until the rail minimum has settled (100 periods); none without
/// ngspice.
Figure time_ngspice(const circuit::Network& network) {
  if (std::system("command -v ngspice >/dev/null 2>&1") != 0) return {};
  const auto folder = std::filesystem::temp_directory_path() / "dropfront_bench";
  std::filesystem::create_directories(folder);
  const auto deck = folder / "bench.cir";
  std::ofstream(deck) << report::make_deck(network, "bench");
  const std::string command = "ngspice -b " + deck.string() + " >/dev/null 2>&1";
  const Figure figure = timed(3, 1, [&] {
    if (std::system(command.c_str()) != 0) std::fprintf(stderr, "ngspice failed\n");
  });
  std::filesystem::remove_all(folder);
  return figure;
}

/// The opening of the document: what the circuit engine takes, beside the outside simulator.
std::string measured_engine() {
  std::string out = "{\n  \"steady_state_us\": {";
  const Board board = shipped_board();
  double half_wave_s = 0;
  std::string available;
  for (const auto& arrangement : circuit::arrangements()) {
    const auto network = arrangement.build(board.values);
    const Figure steady = timed(31, 50, [&] { circuit::solve_steady_state(network); });
    const Figure current = timed(31, 5, [&] {
      circuit::find_available_current(arrangement.build, board.values, board.required_rail_V);
    });
    if (half_wave_s == 0) half_wave_s = steady.median;
    const char* comma = &arrangement == &circuit::arrangements().back() ? "" : ", ";
    out += fmt::format("\"{}\": {}{}", arrangement.name, json(steady, 1e6), comma);
    available += fmt::format("\"{}\": {}{}", arrangement.name, json(current, 1e6), comma);
  }
  out += "},\n  \"available_current_us\": {" + available + "},\n";
  const Figure simulator = time_ngspice(circuit::arrangements().front().build(board.values));
  out += "  \"ngspice_run_us\": " + json(simulator, 1e6) + ",\n";
  out += fmt::format("  \"ngspice_over_steady_state\": {:.0f},\n", simulator.median / half_wave_s);
  return out;
}

}  // namespace

int main(int argc, char** argv) {
  const std::string usage = "usage: dropfront_bench [--json] [PROBLEM.json]\n";
  std::string path = "problems/towel-rail-timer.json";
  for (int k = 1; k < argc; ++k) {
    const std::string word = argv[k];
    if (word == "--help") return std::fputs(usage.c_str(), stdout), 0;
    if (word == "--json") continue;  // the only form there is
    if (word.rfind("--", 0) == 0) return std::fputs(usage.c_str(), stderr), 2;
    path = word;
  }
  try {
    std::string out = measured_engine();
    const auto file = problem::read_problem_file(path);
    const auto& first = file.problems.front();
    const auto bound = problem::bind(first);
    search::SearchOptions options;
    const auto begin = Clock::now();
    const auto outcome = search::run_search(*bound, options);
    const double seconds = std::chrono::duration<double>(Clock::now() - begin).count();
    if (!outcome.front.empty()) {
      const auto design = bound->design(outcome.front.front().choice);
      const Figure whole =
          timed(15, 1, [&] { scoring::score(design, first.requirement, scoring::Depth::compliant); });
      out += "  \"score_us\": " + json(whole, 1e6) + ",\n";
    }
    out += fmt::format(
        "  \"search\": {{\"problem\": \"{}\", \"space\": {:.0f}, \"looked\": {}, \"scored\": {}, "
        "\"seconds\": {}}}\n",
        first.name, outcome.counts.space, outcome.counts.looked, outcome.counts.scored,
        json({seconds, 1}, 1));
    std::fputs((out + "}\n").c_str(), stdout);
  } catch (const std::exception& error) {
    return std::fprintf(stderr, "%s\n", error.what()), 2;
  }
  return 0;
}
