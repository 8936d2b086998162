#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

std::optional<Check> reservoir_ripple(Evidence& evidence) {
  const auto judge = [&](const OperatingPoint& point) {
    const parts::Reservoir& part = *evidence.design().reservoir;
    Check check = at_most("reservoir.ripple", reservoir_current_Arms(evidence, point),
                          carried_ripple_rating_Arms(evidence, point), "A", at_point(point),
                          "r.m.s. current against the rating carried to the running frequency");
    add_figure(check, "rated_ripple_Arms", part.ripple_current_Arms);
    check.figures.push_back({"rated_frequency_Hz", part.ripple_frequency_Hz});
    return check;
  };
  return worst_over(loaded_points(evidence), judge);
}

}  // namespace dropfront::scoring
