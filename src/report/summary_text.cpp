#include "dropfront/report/summary_text.hpp"

#include <fmt/core.h>

#include <algorithm>
#include <set>

#include "dropfront/report/arrangements.hpp"
#include "dropfront/report/confirmation_text.hpp"
#include "dropfront/report/conflict_text.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/report/prices_text.hpp"
#include "dropfront/report/proof_text.hpp"
#include "dropfront/report/ranked_table.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

std::string counts_text(const Result& result) {
  const auto& counts = result.counts;
  std::string text = counted(static_cast<double>(counts.looked)) + " designs looked at, " +
                     counted(static_cast<double>(counts.scored)) + " scored in full, of " +
                     counted(counts.space) + " possible";
  if (proven(result) && result.proof->enumerated) text += " (all of them)";
  return text + ".";
}

}  // namespace

std::string cautions_text(const std::vector<std::string>& cautions) {
  std::string text = "Cautions\n";
  for (const auto& caution : cautions) text += wrapped(caution, "  - ");
  return text;
}

std::string summary_body(const Result& result) {
  std::string text = wrapped(result.problem->title);
  text += std::string(std::min(kTextWidth, display_width(result.problem->title)), '-') + "\n";
  if (result.status == Status::cut_short && !proven(result))
    text += "Cut short: better designs may exist among those not looked at.\n";
  text += wrapped(counts_text(result));
  if (!result.closed && !proven(result) && result.status != Status::cut_short)
    text += wrapped(fmt::format(
        "The {} effort was spent before the search had run out of promising designs: {}.", result.effort,
        result.effort == "deep" ? "better ones may exist" : "a greater --effort may find better ones"));
  if (const std::string proof = proof_text(result); !proof.empty()) text += wrapped(proof);
  if (result.front.empty()) return text + nothing_found(result);
  text += wrapped(counted(static_cast<double>(result.front.size())) +
                  " on the front: no design found is as good in every objective and better in one.");
  std::set<int> described;
  for (const auto& list : result.ranked)
    text += '\n' + ranked_heading(list.name) + '\n' + ranked_table(result, list, described);
  if (!result.extras.empty()) text += "  * complies, not on the front\n";
  if (const std::string confirmed = confirmation_text(result); !confirmed.empty()) text += '\n' + confirmed;
  if (const std::string prices = prices_text(result); !prices.empty()) text += '\n' + prices;
  if (const std::string near = near_misses_text(result, 3); !near.empty())
    text += "\nMissed by one limit only, the nearest\n" + near;
  if (const auto compared = arrangements_text(result.arrangements); !compared.empty())
    text += '\n' + compared;
  return text + "\n" +
         wrapped(
             "Margin: output current to spare in the worst case at the end of life. Standby: nominal "
             "mains, worst new parts. Tightest: the check with the least headroom left.");
}

std::string summary_text(const Result& result) {
  return summary_body(result) + '\n' + cautions_text(result.cautions);
}

}  // namespace dropfront::report
