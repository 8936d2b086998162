#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Broken (2) where every dropper names a class and none is X1 or X2. Theorem.
double dropper_class(const BoxQuestion& question) {
  return question.least_share(question.box.droppers, [&](const parts::Dropper* part) {
    const bool unfit =
        part != nullptr && !part->class_name.empty() && part->class_name != "X1" && part->class_name != "X2";
    return unfit ? 2.0 : 0.0;
  });
}

}  // namespace dropfront::scoring::bounds
