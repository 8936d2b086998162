#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> dropper_class(Evidence& evidence) {
  if (evidence.design().dropper == nullptr) return std::nullopt;
  const std::string& name = evidence.design().dropper->class_name;
  std::optional<bool> fit;
  if (!name.empty()) fit = name == "X1" || name == "X2";
  return must_be("dropper.class", fit, at_corner(""),
                 name.empty() ? "class is not given"
                              : "IEC 60384-14: X1 or X2 for the impulses of a mains line, found " + name);
}

}  // namespace dropfront::scoring
