#include "dropfront/report/proof_text.hpp"

#include <fmt/core.h>

#include <cmath>
#include <numeric>

#include "dropfront/report/for_people.hpp"
#include "dropfront/report/proof_json.hpp"

namespace dropfront::report {

namespace {

double sum(const search::ByKind& designs) { return std::accumulate(designs.begin(), designs.end(), 0.0); }

/// Of the whole space; never "100 %" or "0 %" for what is only nearly so.
std::string share_of(double designs, double space) {
  const double share = space > 0 ? designs / space : 0;
  if (designs <= 0) return "none";
  if (share < 1e-4) return counted(designs);
  return fmt::format("{:.2f} %", std::min(99.99, 100 * share));
}

std::string at_best(const Result& result) {
  using scoring::Objective;
  std::string text;
  const auto& requirement = result.problem->requirement;
  for (std::size_t k = 0; k < requirement.objectives.size() && k < result.proof->open_bounds.size(); ++k) {
    const double bound = result.proof->open_bounds[k];
    if (!std::isfinite(bound)) continue;
    if (!text.empty()) text += ", ";
    switch (requirement.objectives[k]) {
      case Objective::cost:
        text += fmt::format("cost {} {}", rounded(bound, 3), requirement.currency);
        break;
      case Objective::standby_loss:
        text += "standby " + with_unit(bound, "W");
        break;
      case Objective::board_area:
        text += fmt::format("area {} mm2", rounded(bound, 0));
        break;
      case Objective::current_margin:
        text += "margin " + with_unit(-bound, "A");
        break;
    }
  }
  return text;
}

}  // namespace

std::string proof_text(const Result& result) {
  if (!result.proof) return "";
  const search::Proof& proof = *result.proof;
  if (proof.enumerated && proof.complete)
    return result.front.empty()
               ? ""
               : "Proven: every design was looked at, so nothing in these lists does better.";
  if (!proof.complete) {
    std::string text = fmt::format("Not proven: {} designs in {} boxes are still open", counted(proof.left),
                                   counted(static_cast<double>(proof.open_boxes)));
    const std::string best = at_best(result);
    if (!best.empty()) text += "; none of them can do better than " + best + ", each taken by itself";
    return text + ".";
  }
  double broken = proof.undefined;
  for (const auto& check : proof.broken) broken += sum(check);
  const std::string claim = result.front.empty()
                                ? "Proven: no design in these lists complies."
                                : "Proven: nothing in these lists does better than the front.";
  return fmt::format(
      "{} Of {} designs {} break a limit, {} are dominated, {} are replaced by a part no worse, {} were "
      "scored "
      "one by one. Weakest reasoning used: {}.",
      claim, counted(proof.space), share_of(broken, proof.space), share_of(sum(proof.dominated), proof.space),
      share_of(sum(proof.reduced), proof.space), counted(proof.scored), bound_kind_name(proof.weakest()));
}

}  // namespace dropfront::report
