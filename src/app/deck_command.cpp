#include <fmt/format.h>

#include <algorithm>
#include <ostream>

#include "dropfront/app/commands.hpp"
#include "dropfront/report/corner_deck.hpp"
#include "dropfront/report/recorded.hpp"
#include "dropfront/values/input_error.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::app {

namespace {

const scoring::Supply& chosen_supply(const scoring::Requirement& need, const DeckArguments& arguments) {
  if (!arguments.supply) return need.supplies.front();
  std::vector<std::string> known;
  for (const auto& supply : need.supplies) {
    if (supply.name == *arguments.supply) return supply;
    known.push_back(supply.name);
  }
  throw values::InputError("--supply", "",
                           fmt::format("no supply '{}' in this problem{}", *arguments.supply,
                                       values::did_you_mean(*arguments.supply, known)));
}

}  // namespace

ExitStatus deck_command(const DeckArguments& arguments, Console& console) {
  const auto& corners = report::deck_corners();
  if (std::find(corners.begin(), corners.end(), arguments.corner) == corners.end())
    throw values::InputError(
        "--corner", "",
        fmt::format("no corner '{}'{}; allowed: {}", arguments.corner,
                    values::did_you_mean(arguments.corner, corners), fmt::join(corners, ", ")));
  const auto recorded = report::read_recorded(arguments.result, arguments.candidate);
  const auto& need = recorded.problem.requirement;
  const auto& supply = chosen_supply(need, arguments);
  const auto deck =
      report::corner_deck(fmt::format("{}, candidate {}", recorded.problem.title, arguments.candidate),
                          recorded.design, need, supply, arguments.corner);
  if (!deck.usable)
    throw values::InputError(arguments.result, "",
                             fmt::format("candidate {} has no steady state in the corner {}: {}",
                                         arguments.candidate, arguments.corner, deck.reason));
  console.out << deck.text;
  return ExitStatus::done;
}

}  // namespace dropfront::app
