#include <algorithm>
#include <set>

#include "dropfront/parts/catalogue.hpp"
#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

const Catalogue& demo() {
  static const Catalogue catalogue = [] {
    Catalogue lists;
    read_parts_folder(std::string(DROPFRONT_SOURCE_DIR) + "/problems/parts/demo", lists);
    return lists;
  }();
  return catalogue;
}

bool serves(const Resistor& part, const std::string& slot) {
  return part.slots.empty() || std::find(part.slots.begin(), part.slots.end(), slot) != part.slots.end();
}

template <class T, class Predicate>
auto count_of(const std::vector<T>& parts, Predicate wanted) {
  return std::count_if(parts.begin(), parts.end(), wanted);
}

TEST_CASE("The demonstration lists offer enough of every kind") {
  CHECK(count_of(demo().droppers, [](const Dropper& p) {
          return p.capacitance_F >= 47e-9 && p.capacitance_F <= 4.7e-6;
        }) >= 60);
  CHECK(count_of(demo().droppers, [](const Dropper& p) { return p.series_rated; }) > 0);
  CHECK(count_of(demo().droppers, [](const Dropper& p) { return !p.series_rated; }) > 0);
  for (const double rated_Vrms : {275.0, 310.0}) {
    CHECK(count_of(demo().droppers, [=](const Dropper& p) { return p.rated_voltage_Vrms == rated_Vrms; }) >
          0);
  }
  CHECK(count_of(demo().resistors, [](const Resistor& p) { return serves(p, "series_resistor"); }) >= 60);
  CHECK(count_of(demo().resistors, [](const Resistor& p) { return serves(p, "discharge"); }) >= 40);
  CHECK(count_of(demo().clamps, [](const Clamp& p) { return p.voltage_V >= 3.3 && p.voltage_V <= 100; }) >=
        60);
  for (const double rated_W : {0.5, 1.0, 1.3, 3.0}) {
    CHECK(count_of(demo().clamps, [=](const Clamp& p) { return p.rated_power_W == rated_W; }) > 0);
  }
  CHECK(count_of(demo().reservoirs, [](const Reservoir& p) {
          return p.capacitance_F >= 10e-6 && p.capacitance_F <= 2200e-6 && p.rated_voltage_V >= 10 &&
                 p.rated_voltage_V <= 63;
        }) >= 60);
  CHECK_FALSE(demo().rectifiers.empty());
  CHECK(demo().output_stages.size() >= 12);
  for (const StageKind kind : {StageKind::direct, StageKind::linear, StageKind::step_down}) {
    CHECK(count_of(demo().output_stages, [=](const OutputStage& p) { return p.kind == kind; }) > 0);
  }
}

TEST_CASE("Chip resistors for the discharge chain carry the working voltages of their sizes") {
  // Chip sizes: 0603 50 V, 0805 150 V, 1206 and larger 200 V, as restated, copies not kept.
  std::set<double> working_V;
  for (const Resistor& part : demo().resistors) {
    if (serves(part, "discharge") && part.rated_voltage_Vrms) working_V.insert(*part.rated_voltage_Vrms);
  }
  CHECK(working_V.count(150) == 1);
  CHECK(working_V.count(200) == 1);
}

struct Jedec {
  const char* part;
  double vz_V, izt_mA, zzt_ohm, zzk_ohm, izk_mA;
};

// 1N4728A..1N4764A, as restated, copy not kept; 82 V and above from memory.
const Jedec jedec[] = {{"1N4728A", 3.3, 76, 10, 400, 1},      {"1N4729A", 3.6, 69, 10, 400, 1},
                       {"1N4730A", 3.9, 64, 9, 400, 1},       {"1N4731A", 4.3, 58, 9, 400, 1},
                       {"1N4732A", 4.7, 53, 8, 500, 1},       {"1N4733A", 5.1, 49, 7, 550, 1},
                       {"1N4734A", 5.6, 45, 5, 600, 1},       {"1N4735A", 6.2, 41, 2, 700, 1},
                       {"1N4736A", 6.8, 37, 3.5, 700, 1},     {"1N4737A", 7.5, 34, 4, 700, 0.5},
                       {"1N4738A", 8.2, 31, 4.5, 700, 0.5},   {"1N4739A", 9.1, 28, 5, 700, 0.5},
                       {"1N4740A", 10, 25, 7, 700, 0.25},     {"1N4741A", 11, 23, 8, 700, 0.25},
                       {"1N4742A", 12, 21, 9, 700, 0.25},     {"1N4743A", 13, 19, 10, 700, 0.25},
                       {"1N4744A", 15, 17, 14, 700, 0.25},    {"1N4745A", 16, 15.5, 16, 700, 0.25},
                       {"1N4746A", 18, 14, 20, 750, 0.25},    {"1N4747A", 20, 12.5, 22, 750, 0.25},
                       {"1N4748A", 22, 11.5, 23, 750, 0.25},  {"1N4749A", 24, 10.5, 25, 750, 0.25},
                       {"1N4750A", 27, 9.5, 35, 750, 0.25},   {"1N4751A", 30, 8.5, 40, 1000, 0.25},
                       {"1N4752A", 33, 7.5, 45, 1000, 0.25},  {"1N4753A", 36, 7, 50, 1000, 0.25},
                       {"1N4754A", 39, 6.5, 60, 1000, 0.25},  {"1N4755A", 43, 6, 70, 1500, 0.25},
                       {"1N4756A", 47, 5.5, 80, 1500, 0.25},  {"1N4757A", 51, 5, 95, 1500, 0.25},
                       {"1N4758A", 56, 4.5, 110, 2000, 0.25}, {"1N4759A", 62, 4, 125, 2000, 0.25},
                       {"1N4760A", 68, 3.7, 150, 2000, 0.25}, {"1N4761A", 75, 3.3, 175, 2000, 0.25},
                       {"1N4762A", 82, 3, 200, 3000, 0.25},   {"1N4763A", 91, 2.8, 250, 3000, 0.25},
                       {"1N4764A", 100, 2.5, 350, 3000, 0.25}};

TEST_CASE("Rows named after JEDEC zeners carry the JEDEC data") {
  for (const Jedec& row : jedec) {
    INFO(row.part);
    const auto found = std::find_if(demo().clamps.begin(), demo().clamps.end(),
                                    [&](const Clamp& part) { return part.info.name == row.part; });
    REQUIRE(found != demo().clamps.end());
    CHECK(found->voltage_V == row.vz_V);
    CHECK(found->tolerance == 0.05);
    // Milliamperes as typed here and as read there may differ by one rounding.
    CHECK_THAT(found->test_current_A, Catch::Matchers::WithinRel(row.izt_mA * 1e-3, 1e-12));
    CHECK(found->slope_resistance_ohm == row.zzt_ohm);
    CHECK(found->knee_resistance_ohm == row.zzk_ohm);
    REQUIRE(found->knee_current_A);
    CHECK_THAT(*found->knee_current_A, Catch::Matchers::WithinRel(row.izk_mA * 1e-3, 1e-12));
    CHECK(found->rated_power_W == 1.0);
  }
}

TEST_CASE("The JEDEC family's power relations hold row by row") {
  for (const Clamp& part : demo().clamps) {
    if (part.info.name.rfind("1N47", 0) != 0) continue;
    INFO(part.info.name);
    // The family is tested at a quarter of its 1 W: test currents are rounded to 0.5 mA or less, 4 % at most.
    CHECK_THAT(part.voltage_V * part.test_current_A, Catch::Matchers::WithinRel(0.25, 0.04));
    // Surge 8.3 ms: VZ times IS lies between 4.34 W and 4.73 W in every row of the family's table.
    REQUIRE(part.pulse_power_W);
    CHECK(*part.pulse_power_W >= 4.34);
    CHECK(*part.pulse_power_W <= 4.73);
    REQUIRE(part.pulse_time_s);
    CHECK_THAT(*part.pulse_time_s, Catch::Matchers::WithinAbs(8.3e-3, 1e-12));
  }
}

TEST_CASE("Every row of the demonstration lists says that its data are invented") {
  const auto check = [](const auto& parts) {
    for (const auto& part : parts) {
      INFO(part.info.name);
      const bool said = part.info.source.find("invented") != std::string::npos ||
                        part.info.source.find("no part") != std::string::npos;
      CHECK(said);
    }
  };
  check(demo().droppers);
  check(demo().resistors);
  check(demo().clamps);
  check(demo().reservoirs);
  check(demo().rectifiers);
  check(demo().output_stages);
  check(demo().varistors);
  check(demo().fuses);
  check(demo().thyristors);
  check(demo().ceramics);
}

TEST_CASE("A price never rises with the quantity, and sizes are whole boxes") {
  const auto check = [](const auto& parts) {
    for (const auto& part : parts) {
      INFO(part.info.name);
      for (std::size_t i = 1; i < part.info.price_breaks.size(); ++i) {
        CHECK(part.info.price_breaks[i].price_micro <= part.info.price_breaks[i - 1].price_micro);
      }
      CHECK(part.info.length_um.has_value() == part.info.width_um.has_value());
    }
  };
  check(demo().droppers);
  check(demo().resistors);
  check(demo().clamps);
  check(demo().reservoirs);
  check(demo().output_stages);
}

}  // namespace
}  // namespace dropfront::parts
