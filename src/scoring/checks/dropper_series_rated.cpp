#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> dropper_series_rated(Evidence& evidence) {
  if (!evidence.requirement().limits.series_rated || evidence.design().dropper == nullptr)
    return std::nullopt;
  return must_be("dropper.series_rated", evidence.design().dropper->series_rated, at_corner(""),
                 "the maker states use in series with the mains");
}

}  // namespace dropfront::scoring
