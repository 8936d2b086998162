#include "dropfront/circuit/discharge.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "support/catch.hpp"

namespace dropfront::circuit {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
constexpr double kRounding = 1e-12;  // closed form: rounding only

struct Row {
  double capacitance_uF;
  double r34_Mohm[6];  // after 1 s at 34 V, from the crest of 230, 253, 264, 120, 132, 277 V
  double r60_Mohm[3];  // after 2 s at 60 V, from the crest of 230, 264, 120 V
  double time_constant_Mohm;
};

// Largest total bleeder by the rules of IEC 60335-1 clause 22.5 (34 V, 1 s), IEC 62368-1 clause 5.5.2.2
// (2 s; 60 V from memory) and IEC 60950-1 clause 2.1.1.7 (time constant 1 s).
const Row kTable[] = {
    {0.10, {4.428, 4.249, 4.173, 6.220, 5.872, 4.091}, {11.832, 10.940, 19.236}, 10.0},
    {0.22, {2.013, 1.931, 1.897, 2.827, 2.669, 1.860}, {5.378, 4.973, 8.744}, 4.545},
    {0.33, {1.342, 1.288, 1.265, 1.885, 1.779, 1.240}, {3.586, 3.315, 5.829}, 3.030},
    {0.47, {0.942, 0.904, 0.888, 1.323, 1.249, 0.870}, {2.517, 2.328, 4.093}, 2.128},
    {0.68, {0.651, 0.625, 0.614, 0.915, 0.864, 0.602}, {1.740, 1.609, 2.829}, 1.471},
    {1.00, {0.443, 0.425, 0.417, 0.622, 0.587, 0.409}, {1.183, 1.094, 1.924}, 1.000},
};

TEST_CASE("the largest bleeder leaves exactly the allowed voltage at the asked time") {
  for (double capacitance : {0.1e-6, 0.47e-6, 4.7e-6})
    for (double line_Vrms : {120.0, 253.0}) {
      const double crest = std::sqrt(2.0) * line_Vrms;
      const double bleeder = largest_bleeder_ohm(crest, 34, capacitance, 1);
      CHECK_THAT(discharged_voltage_V(crest, bleeder, capacitance, 1), WithinRel(34.0, 1e-9));
      CHECK(discharged_voltage_V(crest, bleeder * 1.001, capacitance, 1) > 34);
    }
}

TEST_CASE("a capacitor without a bleeder keeps its voltage") {
  CHECK(discharged_voltage_V(358, std::numeric_limits<double>::infinity(), 1e-6, 1) == 358);
}

TEST_CASE("the time constant leaves 37 % of the voltage") {
  // IEC 60950-1 clause 2.1.1.7: 37 % of the initial voltage in one time constant; 1 % for the printed figure.
  CHECK_THAT(discharged_voltage_V(100, 1e6, 1e-6, 1), WithinRel(37.0, 0.01));
}

TEST_CASE("a voltage already below the limit needs no bleeder") {
  CHECK(std::isinf(largest_bleeder_ohm(30, 34, 1e-6, 1)));
}

TEST_CASE("the largest bleeders of the three rules agree with the table") {
  constexpr double kPrinted = 0.00051;  // the table is printed to 1 kilohm
  const double lines34[] = {230, 253, 264, 120, 132, 277};
  const double lines60[] = {230, 264, 120};
  for (const Row& row : kTable) {
    const double capacitance = row.capacitance_uF * 1e-6;
    INFO("C = " << row.capacitance_uF << " uF");
    for (int i = 0; i < 6; ++i)
      CHECK_THAT(largest_bleeder_ohm(std::sqrt(2.0) * lines34[i], 34, capacitance, 1) / 1e6,
                 WithinAbs(row.r34_Mohm[i], kPrinted));
    for (int i = 0; i < 3; ++i)
      CHECK_THAT(largest_bleeder_ohm(std::sqrt(2.0) * lines60[i], 60, capacitance, 2) / 1e6,
                 WithinAbs(row.r60_Mohm[i], kPrinted));
    const double e = std::exp(1.0);
    CHECK_THAT(largest_bleeder_ohm(e, 1, capacitance, 1) / 1e6, WithinAbs(row.time_constant_Mohm, kPrinted));
  }
}

TEST_CASE("equal elements share the voltage equally and one element takes it all") {
  CHECK_THAT(greatest_voltage_share(2, 0), WithinRel(0.5, kRounding));
  CHECK_THAT(greatest_voltage_share(3, 0), WithinRel(1.0 / 3, kRounding));
  CHECK(greatest_voltage_share(1, 0.05) == 1);
}

TEST_CASE("no element of a chain exceeds the greatest share and power wherever its tolerances lie") {
  const double tolerance = 0.2, nominal = 100e3, line = 253;
  for (int count = 1; count <= 3; ++count) {
    double share = 0, power = 0;
    // Every combination of eleven places in the tolerance band, the first element the one looked at.
    const int places = 11, total = count == 1   ? places
                                   : count == 2 ? places * places
                                                : places * places * places;
    for (int code = 0; code < total; ++code) {
      double sum = 0, first = 0;
      for (int element = 0, rest = code; element < count; ++element, rest /= places) {
        const double resistance = nominal * (1 - tolerance + 2 * tolerance * (rest % places) / (places - 1));
        if (element == 0) first = resistance;
        sum += resistance;
      }
      share = std::max(share, first / sum);
      power = std::max(power, line * line * first / (sum * sum));
    }
    CHECK_THAT(greatest_voltage_share(count, tolerance), WithinRel(share, 1e-9));
    // The grid holds the corners; for two elements the worst lies between them by symmetry, on the grid's
    // end.
    CHECK_THAT(greatest_element_power_W(line, count, nominal, tolerance), WithinRel(power, 1e-9));
  }
}

}  // namespace
}  // namespace dropfront::circuit
