#pragma once
#include <string_view>

#include "dropfront/circuit/network.hpp"

namespace dropfront::circuit {

/// Slot or sink by which a loss or a fault is reported, e.g. "series_resistor"; "load" is all that the rail
/// feeds.
std::string_view owner_name(Owner owner);

}  // namespace dropfront::circuit
