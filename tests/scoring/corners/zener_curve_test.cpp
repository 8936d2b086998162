#include "dropfront/scoring/corners/zener_curve.hpp"

#include <algorithm>
#include <cmath>

#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

double current_A(const circuit::ClampCurve& curve, double v) {
  const auto branch = [&](const circuit::Curve& c) {
    return std::max(0.0, (v - c.threshold_V) / c.slope_ohm);
  };
  return branch(curve.main) + (curve.knee ? branch(*curve.knee) : 0.0);
}

}  // namespace

TEST_CASE("At any voltage the low curve conducts most, then the nominal, then the high curve") {
  for (const auto& part : {test::zener_4V7(), test::zener_12V(), test::zener_47V()}) {
    const auto low = zener_curve(part, ZenerCurve::low, 25);
    const auto nominal = zener_curve(part, ZenerCurve::nominal, 25);
    const auto high = zener_curve(part, ZenerCurve::high, 25);
    for (double v = 0; v < 1.5 * part.voltage_V; v += 0.01 * part.voltage_V) {
      REQUIRE(current_A(low, v) >= current_A(nominal, v));
      REQUIRE(current_A(nominal, v) >= current_A(high, v));
    }
  }
}

TEST_CASE("At the test current nominal and high curve pass through the data, the low curve stays below") {
  const auto part = test::zener_12V();
  const double test_A = part.test_current_A;
  const auto at = [&](ZenerCurve which) {
    const auto c = zener_curve(part, which, 25).main;
    return c.threshold_V + c.slope_ohm * test_A;
  };
  // Straight lines through one point: rounding only.
  REQUIRE_THAT(at(ZenerCurve::nominal), WithinRel(12.0, 1e-12));
  REQUIRE_THAT(at(ZenerCurve::low_slope), WithinRel(12.6, 1e-12));
  REQUIRE(at(ZenerCurve::high) >= 12.6);
  REQUIRE(at(ZenerCurve::low) <= 11.4);
}

TEST_CASE("The knee branch meets the knee current on the curve dV = Z dI with Z falling as 1/I") {
  // Z·I lies between Zzk·Izk and Zzt·Izt; integrating dV = (Z·I)·d ln I with a product that runs linearly in
  // ln I between the two data points gives the drop from the test current down to the knee current.
  const auto part = test::zener_4V7();
  const auto curve = zener_curve(part, ZenerCurve::low, 25);
  REQUIRE(curve.knee.has_value());
  const double Izk = *part.knee_current_A, Zzk = *part.knee_resistance_ohm;
  const double Izt = part.test_current_A, Zzt = part.slope_resistance_ohm;
  const int steps = 100000;
  double drop_V = 0;
  for (int i = 0; i < steps; ++i) {
    const double share = (i + 0.5) / steps;
    drop_V += (Zzk * Izk * (1 - share) + Zzt * Izt * share) * std::log(Izt / Izk) / steps;
  }
  const double at_knee_V = curve.knee->threshold_V + curve.knee->slope_ohm * Izk;
  // Midpoint rule of a linear integrand: exact but for rounding.
  REQUIRE_THAT(at_knee_V, WithinAbs(part.voltage_min_V - drop_V, 1e-9));
  REQUIRE(curve.knee->threshold_V < curve.main.threshold_V);
}

TEST_CASE("A low-voltage zener's knee reaches much further down than a 12 V zener's") {
  const auto soft = zener_curve(test::zener_4V7(), ZenerCurve::low, 25);
  const auto sharp = zener_curve(test::zener_12V(), ZenerCurve::low, 25);
  REQUIRE(soft.knee->threshold_V < 0.75 * soft.main.threshold_V);
  REQUIRE(sharp.knee->threshold_V > 0.90 * sharp.main.threshold_V);
}

TEST_CASE(
    "Voltage follows the junction by the temperature coefficient, up above 5.5 V and down below 4.7 V") {
  const auto rise = [](const parts::Clamp& part) {
    return zener_curve(part, ZenerCurve::nominal, 125).main.threshold_V -
           zener_curve(part, ZenerCurve::nominal, 25).main.threshold_V;
  };
  REQUIRE_THAT(rise(test::zener_12V()), WithinRel(12 * 0.00077 * 100, 1e-9));  // a straight law
  REQUIRE(rise(test::zener_4V7()) < 0);
}

TEST_CASE("Without knee data, or with data that show no knee, there is one branch") {
  auto part = test::zener_12V();
  part.knee_current_A.reset();
  REQUIRE_FALSE(zener_curve(part, ZenerCurve::low, 25).knee.has_value());
  part.knee_current_A = part.test_current_A;
  REQUIRE_FALSE(zener_curve(part, ZenerCurve::low, 25).knee.has_value());
}
