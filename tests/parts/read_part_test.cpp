#include "dropfront/parts/read_part.hpp"

#include "parts/map_source.hpp"
#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

const MapSource film =
    part_of({{"capacitance", "1.5 uF"}, {"tolerance", "10 %"}, {"rated_voltage", "275 V"}});
const MapSource wire = part_of({{"resistance", "100 R"}, {"tolerance", "5 %"}});
const MapSource can = part_of({{"capacitance", "220 uF"}, {"tolerance", "20 %"}, {"rated_voltage", "25 V"}});

TEST_CASE("A dropper reads its values in SI and takes the documented defaults") {
  const Dropper part = read_dropper(film, true);
  CHECK(part.capacitance_F == 1.5e-6);
  CHECK(part.tolerance == 0.1);
  CHECK(part.rated_voltage_Vrms == 275);
  CHECK_FALSE(part.series_rated);
  CHECK(part.loss_tangent == 0.001);
  CHECK(part.end_of_life_loss == 0.30);
  CHECK(part.temperature_coefficient_per_K == -200e-6);
  CHECK(part.class_name.empty());
  CHECK_FALSE(part.slew_V_per_s);
  CHECK_FALSE(part.impulse_V);
  CHECK(read_dropper(film.with("series_rated", "true"), true).end_of_life_loss == 0.10);
  CHECK(read_dropper(film.with("series_rated", "true").with("end_of_life_loss", "12 %"), true)
            .end_of_life_loss == 0.12);
  CHECK(read_dropper(film.with("slew", "150 V/us"), true).slew_V_per_s == 150e6);
}

TEST_CASE("A resistor without rated power has no thermal resistance, with it the derating line's") {
  CHECK_FALSE(read_resistor(wire, true).thermal_resistance_K_per_W);
  const Resistor part = read_resistor(wire.with("rated_power", "2 W"), true);
  CHECK(part.thermal_resistance_K_per_W == 42.5);  // (155 - 70)/2
  CHECK(part.construction == Construction::film);
  CHECK_FALSE(part.fusible);
  CHECK(part.slots.empty());
  CHECK(read_resistor(wire.with("slots", "series_resistor discharge"), true).slots ==
        std::vector<std::string>{"series_resistor", "discharge"});
}

TEST_CASE("A reservoir takes ESR, leakage and ageing from its data-sheet class") {
  const Reservoir part = read_reservoir(can, true);
  // tan(delta) 0.14 at 25 V: 0.844 ohm, to the three digits of the source's table.
  CHECK_THAT(part.esr_ohm, Catch::Matchers::WithinAbs(0.844, 0.0005));
  CHECK(part.esr_cold_ohm == 2 * part.esr_ohm);
  CHECK(part.leakage_A == 0.01 * 220e-6 * 25);
  CHECK(part.ripple_frequency_Hz == 120);
  CHECK(part.end_of_life_esr == 2);
  CHECK(part.end_of_life_loss == 0.20);
  CHECK_FALSE(part.life_h);
  CHECK(read_reservoir(can.with("life_hours", "2000").with("life_temperature", "105"), true).life_h ==
        2000.0);
  CHECK(read_reservoir(can.with("esr", "0.8 R"), true).esr_cold_ohm == 1.6);
}

TEST_CASE("Kinds without required numbers read from nothing but their defaults") {
  const Rectifier diode = read_rectifier(part_of({}), true);
  CHECK(diode.threshold_voltage_V == 0.67);
  CHECK(diode.slope_resistance_ohm == 0.67);
  CHECK_FALSE(diode.reverse_voltage_V);
  CHECK(diode.info.name == "inline rectifier");
  CHECK(read_thyristor(part_of({}), true).on_voltage_V == 1);
}

TEST_CASE("An inline part may go without name and take one price; a row may not") {
  const Dropper part = read_dropper(film.with("price", "0.25").with("length_mm", "26.5"), true);
  CHECK(part.info.name == "inline dropper 1.5 uF");
  CHECK(price_micro_at(part.info, 1) == 250000);
  CHECK(part.info.length_um == 26500);
  CHECK_FALSE(part.info.width_um);
  CHECK(refusal(read_dropper, film, false) == "design.json: part is missing: every row needs a name");
  CHECK(refusal(read_dropper, film.with("price", "1").with("part", "x"), false).find("no column 'price'") !=
        std::string::npos);
  CHECK(refusal(read_dropper, film.with("price", "1").with("price_100", "1")).find("give one") !=
        std::string::npos);
}

TEST_CASE("Missing required columns are named with what they are for") {
  CHECK(refusal(read_dropper, film.without("capacitance")) ==
        "design.json: capacitance is missing: every dropper needs it, such as 470 nF");
  CHECK(refusal(read_dropper, film.without("tolerance")).find("tolerance is missing") != std::string::npos);
  CHECK(refusal(read_dropper, film.without("rated_voltage")).find("rated_voltage is missing") !=
        std::string::npos);
  CHECK(refusal(read_reservoir, can.without("rated_voltage")).find("rated_voltage is missing") !=
        std::string::npos);
  CHECK(refusal(read_resistor, wire.without("resistance")).find("resistance is missing") !=
        std::string::npos);
  CHECK(refusal(read_varistor, part_of({})).find("continuous_voltage is missing") != std::string::npos);
  CHECK(refusal(read_fuse, part_of({})).find("rated_current is missing") != std::string::npos);
  CHECK(refusal(read_ceramic, part_of({{"capacitance", "100n"}})).find("tolerance is missing") !=
        std::string::npos);
}

TEST_CASE("Unknown columns are refused with the nearest known one") {
  CHECK(refusal(read_dropper, film.with("lossTangent", "0.001")) ==
        "design.json:lossTangent: a dropper has no column 'lossTangent' (did you mean 'loss_tangent'?)");
  CHECK(refusal(read_output_stage, part_of({{"flavour", "sweet"}})) ==
        "design.json:flavour: an output stage has no column 'flavour'");
}

TEST_CASE("A value that cannot be is refused with what is allowed") {
  CHECK(refusal(read_dropper, film.with("capacitance", "10 V")) ==
        "design.json:capacitance: capacitance '10 V' is a voltage, a capacitance is wanted, such as 470 nF");
  CHECK(refusal(read_dropper, film.with("capacitance", "470")) ==
        "design.json:capacitance: capacitance '470' is out of range, allowed is more than 0 F and at most "
        "1000 uF");
  CHECK(refusal(read_dropper, film.with("tolerance", "100 %")).find("less than 100 %") != std::string::npos);
  CHECK(refusal(read_dropper, film.with("tolerance", "10")).find("tolerance '10' is out of range") !=
        std::string::npos);
  CHECK(refusal(read_dropper, film.with("series_rated", "maybe")).find("write true or false") !=
        std::string::npos);
  CHECK(refusal(read_dropper, film.with("class", "Y2")).find("write X1, X2, X3") != std::string::npos);
  CHECK(refusal(read_resistor, wire.with("construction", "wirewond")).find("did you mean 'wirewound'?") !=
        std::string::npos);
  CHECK(refusal(read_resistor, wire.with("slots", "discharge serie_resistor"))
            .find("did you mean 'series_resistor'?") != std::string::npos);
  CHECK(refusal(read_dropper, film.with("price_1", "-1")).find("out of range") != std::string::npos);
  CHECK(refusal(read_dropper, film.with("length_mm", "0.1 V")).find("is a voltage") != std::string::npos);
  CHECK(refusal(read_reservoir, can.with("end_of_life_esr", "0.5")).find("at least 1") != std::string::npos);
}

TEST_CASE("Columns that contradict each other are refused") {
  CHECK(refusal(read_resistor, wire.with("rated_voltage", "400 V").with("overload_voltage", "200 V"))
            .find("overload_voltage is less") != std::string::npos);
  CHECK(refusal(read_reservoir, can.with("surge_voltage", "20 V")).find("surge_voltage is less") !=
        std::string::npos);
  CHECK(refusal(read_reservoir, can.with("esr", "2 R").with("esr_cold", "1 R")).find("esr_cold is less") !=
        std::string::npos);
  const MapSource disc = part_of({{"continuous_voltage", "275 V"}, {"clamp_voltage", "200 V"}});
  CHECK(refusal(read_varistor, disc).find("not above continuous_voltage") != std::string::npos);
  const MapSource gate = part_of({{"holding_current", "6 mA"}, {"latching_current", "5 mA"}});
  CHECK(refusal(read_thyristor, gate).find("latching_current is less") != std::string::npos);
}

}  // namespace
}  // namespace dropfront::parts
