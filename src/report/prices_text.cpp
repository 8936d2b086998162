#include "dropfront/report/prices_text.hpp"

#include <fmt/core.h>

#include <set>

#include "dropfront/problem/limit_prices.hpp"
#include "dropfront/problem/names.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

using scoring::Objective;

std::vector<problem::LimitPrice> prices_of(const Result& result) {
  std::vector<problem::PricedMember> front;
  for (const auto& entry : result.front) front.push_back({entry.number, entry.objectives});
  return problem::limit_prices(result.problem->requirement.objectives, front);
}

std::string unit_words(Objective objective) {
  if (objective == Objective::current_margin) return "1 mA more load";
  return objective == Objective::standby_loss ? "0.1 W less standby" : "100 mm2 less board";
}

std::string gain_text(Objective objective, double gain) {
  if (objective == Objective::current_margin) return rounded(1e3 * gain, 2) + " mA";
  return objective == Objective::standby_loss ? rounded(gain, 3) + " W" : rounded(gain, 0) + " mm2";
}

}  // namespace

std::string prices_text(const Result& result) {
  const auto prices = prices_of(result);
  if (prices.empty()) return "";
  const std::string currency = result.problem->requirement.currency;
  TextTable table({"what costs", ">" + currency, ">from no", ">to no", ">in a step of", ">that costs"});
  for (const auto& price : prices) {
    std::set<std::size_t> shown{0, price.steps.size() / 2, price.steps.size() - 1};
    for (const std::size_t i : shown) {
      const auto& step = price.steps[i];
      table.row({unit_words(price.objective), rounded(step.per(price.unit), 4), std::to_string(step.from),
                 std::to_string(step.to), gain_text(price.objective, step.gain), rounded(step.extra, 3)});
    }
  }
  return wrapped(fmt::format("Prices of limits, from the cheapest design on: differences between neighbours "
                             "on the front, which is {}.",
                             proven(result) ? "proven" : "not proven")) +
         table.text();
}

void write_prices(JsonWriter& json, const Result& result) {
  json.begin_array();
  for (const auto& price : prices_of(result)) {
    json.begin_object();
    json.member("objective", problem::objective_name(price.objective));
    json.member("per", price.unit);
    json.member("unit", price.objective == Objective::current_margin ? "A"
                        : price.objective == Objective::standby_loss ? "W"
                                                                     : "mm2");
    json.member("proven", proven(result));
    json.key("steps");
    json.begin_array();
    for (const auto& step : price.steps) {
      json.begin_object(JsonWriter::Layout::flat);
      json.member("from", step.from);
      json.member("to", step.to);
      json.member("gain", step.gain);
      json.member("extra_cost", step.extra);
      json.member("price", step.per(price.unit));
      json.end_object();
    }
    json.end_array();
    json.end_object();
  }
  json.end_array();
}

}  // namespace dropfront::report
