#pragma once
#include <vector>

#include "dropfront/circuit/element_values.hpp"
#include "dropfront/scoring/check.hpp"

namespace dropfront::scoring {

/// The element values of a corner by name, in the order line to rail: enough to draw and solve the network
/// again by hand. What the corner does not have (a chain, a knee) is left out.
std::vector<Term> corner_figures(const circuit::ElementValues& values, double local_degC,
                                 double clamp_junction_degC);

}  // namespace dropfront::scoring
