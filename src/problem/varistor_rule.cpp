#include "dropfront/problem/varistor_rule.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/values/quantity.hpp"

namespace dropfront::problem {

std::optional<std::string> low_varistor(const parts::Varistor& part,
                                        const scoring::Requirement& requirement) {
  if (!part.clamp_voltage_V) return std::nullopt;
  double crest_V = 0;
  for (const auto& supply : requirement.supplies) {
    crest_V = std::max(crest_V, scoring::mains_shapes(supply).rich.crest_V());
  }
  if (*part.clamp_voltage_V > crest_V) return std::nullopt;
  return fmt::format("the varistor {} clamps at {}; allowed: above the crest of the highest line, {}",
                     part.info.name, values::format_quantity(*part.clamp_voltage_V, values::Unit::volt),
                     values::format_quantity(std::round(crest_V), values::Unit::volt));
}

}  // namespace dropfront::problem
