#pragma once
#include <cstdint>
#include <string_view>

namespace dropfront::scoring {

/// Creepage distance in micrometres for a working voltage, by pollution degree (1, 2, 3) and material group
/// ("I", "II", "IIIa", "IIIb"): the table's next row up, not interpolated. Above the last row (500 V) it
/// grows in proportion; pollution degrees outside 1..3 take the nearest. Source: IEC 60664-1 table F.4, basic
/// insulation, rows of 50 V to 500 V from memory.
std::int64_t creepage_um(double voltage_Vrms, int pollution_degree, std::string_view material_group);

}  // namespace dropfront::scoring
