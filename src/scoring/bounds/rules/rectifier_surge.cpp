#include "dropfront/scoring/bounds/empty_rail.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Clamp across: the whole line current of a plug-in's first moment passes a rectifier. Over the best surge
/// rating. Ahead, the clamp takes an unknown part: nothing is shown. Theorem.
double rectifier_surge(const BoxQuestion& question) {
  if (!question.ends.known_circuit() || question.ahead()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double peak_A = first_moment(question, charge, charge.clamp_V, 0).line_A;
  return question.least_share(question.box.rectifiers, [&](const parts::Rectifier* part) {
    return part->surge_current_A ? peak_A / *part->surge_current_A : 0;
  });
}

}  // namespace dropfront::scoring::bounds
