#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

/// A varistor wears out to a short: what feeds it must open. A fuse stands first in the line; a fusible
/// series resistor helps only a varistor behind it.
std::optional<Check> varistor_protected(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.varistor == nullptr) return std::nullopt;
  const bool by_fuse = design.fuse != nullptr;
  const bool by_resistor = !design.varistor_before && design.series_resistor->fusible;
  return must_be("varistor.protected", by_fuse || by_resistor, at_corner(""),
                 by_fuse       ? "a fuse stands before it"
                 : by_resistor ? "a fusible series resistor stands before it"
                               : "neither a fuse nor a fusible part stands before it");
}

}  // namespace dropfront::scoring
