#include "dropfront/report/assess_text.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "dropfront/report/cautions.hpp"
#include "dropfront/report/design_slots.hpp"
#include "dropfront/report/faults_report.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/report/summary_text.hpp"
#include "dropfront/report/text_table.hpp"
#include "dropfront/scoring/check_formulas.hpp"

namespace dropfront::report {

namespace {

std::string parts_text(const scoring::Design& design, const scoring::Requirement& requirement) {
  const std::string& currency = requirement.currency;
  TextTable table({"slot", "part", "value", ">pieces", ">" + currency + " each"});
  for (const SlotPart& part : design_slots(design)) {
    const auto price_micro = price_micro_at(*part.info, requirement.volume);
    const auto price = price_micro ? std::optional(static_cast<double>(*price_micro) / 1e6) : std::nullopt;
    table.row({std::string(part.slot), part.info->name, part.value, std::to_string(part.placed),
               part.placed > 0 ? rounded(price, 3) : ""});
  }
  return table.text();
}

std::string margin_year_text(const scoring::Score& score) {
  if (!score.current_margin_horizon_years) return "";
  if (score.current_margin_zero_year) return "; gone in year " + rounded(score.current_margin_zero_year, 1);
  return "; not gone within " + rounded(score.current_margin_horizon_years, 0) + " years";
}

std::string objectives_text(const scoring::Score& score, const std::string& currency, bool several) {
  const auto on = [several](const std::string& supply) { return several ? " on " + supply : std::string(); };
  const auto& o = score.objectives;
  const auto amount = [](const std::optional<double>& value, std::string_view unit) {
    return value ? with_unit(*value, unit) : std::string("unknown");
  };
  const std::string cost = cost_units(o) ? rounded(cost_units(o), 3) + " " + currency : "unknown";
  const std::string area = area_mm2(o) ? rounded(area_mm2(o), 0) + " mm2" : "unknown";
  return wrapped("cost " + cost + ", standby loss " + amount(o.standby_loss_W, "W") +
                     on(score.standby_supply) + ", board area " + area + ", current margin " +
                     amount(o.current_margin_A, "A") + on(score.margin_supply) + " (" +
                     amount(score.current_margin_new_A, "A") + " with new parts" + margin_year_text(score) +
                     ")",
                 "  ");
}

std::string operations_text(const scoring::SupplyOperations& supply, bool named) {
  TextTable table({"corner", ">degC", ">load mA", ">rail min V", ">max V", ">ripple V", ">input W",
                   ">input mA", ">available mA"});
  for (const auto& operation : supply.operations) {
    const auto& state = operation.state;
    const auto figure = [&state](double value) {
      return state.usable() ? std::optional(value) : std::nullopt;
    };
    table.row({operation.corner, rounded(operation.ambient_degC, 0),
               rounded(1000 * operation.load_current_A, 2), rounded(figure(state.rail_min_V), 2),
               rounded(figure(state.rail_max_V), 2), rounded(figure(state.ripple_Vpp()), 3),
               rounded(figure(state.input_power_W), 3), rounded(figure(1000 * state.input_current_Arms), 2),
               rounded(thousandfold(operation.available_current_A), 2)});
    if (!operation.note.empty()) table.note(operation.note, 4);
    if (!state.reason.empty()) table.note(state.reason, 4);
  }
  return (named ? "  " + supply.supply + "\n" : "") + table.text();
}

std::string amount(const std::optional<double>& value, std::string_view unit) {
  return value ? with_unit(*value, unit) : "-";
}

std::string place_text(const scoring::At& at, bool several_supplies) {
  std::string text = several_supplies && !at.supply.empty() ? at.supply + " " + at.corner : at.corner;
  if (!at.load.empty()) text += (text.empty() ? "load " : ", load ") + at.load;
  if (at.ambient_degC) text += ", " + rounded(at.ambient_degC, 0) + " degC";
  if (at.phase_deg) text += ", " + rounded(at.phase_deg, 0) + " degrees of phase";
  if (!at.ends.empty()) text += ", " + at.ends;
  return text;
}

/// Names and numbers, in four figures each: the JSON document has them exactly.
std::string figures_text(const std::vector<scoring::Term>& figures) {
  std::string text;
  for (const auto& figure : figures)
    text += fmt::format("{}{} {:.4g}", text.empty() ? "" : ", ", figure.name, figure.value);
  return text;
}

std::string result_word(const scoring::Check& check) {
  if (check.unsolved) return "UNSOLVED";
  if (!check.pass) return "not given";
  return *check.pass ? "holds" : "FAILS";
}

std::string checks_text(const scoring::Score& score, const AssessTextOptions& options,
                        bool several_supplies) {
  TextTable table({"check", ">value", "", ">limit", ">headroom", "", "worst at"});
  for (const auto& check : score.checks) {
    const bool yes_no = check.yes_or_no() && check.value;
    table.row({std::string(check.id),
               yes_no ? (*check.value > 0 ? "yes" : "no") : amount(check.value, check.unit),
               yes_no          ? ""
               : check.at_most ? "<="
                               : ">=",
               yes_no ? "yes" : amount(check.limit, check.unit), yes_no ? "" : percent(check.headroom()),
               result_word(check), check.at.corner});
    if (!options.explain) continue;
    const std::string place = place_text(check.at, several_supplies);
    if (!place.empty()) table.note("at " + place, 6);
    if (!check.basis.empty()) table.note(check.basis, 6);
    table.note("formula: " + std::string(scoring::check_formula(check.id)), 6);
    if (!check.figures.empty()) table.note("took " + figures_text(check.figures), 6);
    if (!check.at.values.empty()) table.note("corner " + figures_text(check.at.values), 6);
  }
  return table.text();
}

std::string verdict_text(const scoring::Score& score) {
  const auto failed = std::count_if(score.checks.begin(), score.checks.end(),
                                    [](const auto& check) { return check.pass == std::optional(false); });
  const auto open =
      std::count_if(score.checks.begin(), score.checks.end(), [](const auto& check) { return !check.pass; });
  std::string text = "Verdict: " + std::string(verdict_name(score.verdict)) + ", " +
                     std::to_string(score.checks.size()) + " checks";
  if (failed > 0) text += ", " + std::to_string(failed) + " failed";
  if (open > 0) text += ", " + std::to_string(open) + " without an answer";
  return text + "\n";
}

/// Red for the words that say something failed. The table is laid out before, so widths stay right.
std::string coloured(std::string text) {
  for (const std::string word : {"FAILS", "UNSOLVED", "breaks limits"})
    for (auto at = text.find(word); at != std::string::npos; at = text.find(word, at + word.size() + 9))
      text.replace(at, word.size(), "\x1b[31m" + word + "\x1b[0m");
  return text;
}

}  // namespace

std::string assess_text(const std::string& title, const scoring::Design& design,
                        const scoring::Requirement& requirement, const scoring::Score& score,
                        const AssessTextOptions& options) {
  const bool several = requirement.supplies.size() > 1;
  std::string text = wrapped(title) + verdict_text(score);
  if (design.arrangement) text += "\nParts, " + std::string(design.arrangement->name) + "\n";
  text += parts_text(design, requirement);
  text += "\nObjectives\n" + objectives_text(score, requirement.currency, several);
  text += "\nOperation\n";
  for (const auto& supply : score.operations) text += operations_text(supply, several);
  text += "\nChecks\n" + checks_text(score, options, several) + "\n";
  if (!score.faults.empty()) text += faults_text(score.faults) + "\n";
  text += cautions_text(with_standing_cautions(score.cautions));
  return options.colour ? coloured(text) : text;
}

}  // namespace dropfront::report
