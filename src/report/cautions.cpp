#include "dropfront/report/cautions.hpp"

#include <algorithm>

namespace dropfront::report {

const std::vector<std::string>& standing_cautions() {
  static const std::vector<std::string> cautions{
      "Not isolated: every node, the regulated output and sensor leads included, is at mains potential.",
      "Never touch it or connect earthed instruments to a running circuit; use an isolating transformer; "
      "treat line and neutral as interchangeable.",
      "A result is a calculation, not an approval: local codes, the product's safety standard and licensed "
      "practice decide."};
  return cautions;
}

std::vector<std::string> with_standing_cautions(const std::vector<std::string>& own) {
  std::vector<std::string> all = standing_cautions();
  for (const std::string& caution : own)
    if (std::find(all.begin(), all.end(), caution) == all.end()) all.push_back(caution);
  return all;
}

}  // namespace dropfront::report
