#include <fmt/format.h>

#include <cmath>

#include "dropfront/problem/defaults.hpp"
#include "dropfront/problem/names.hpp"
#include "dropfront/problem/sections.hpp"
#include "dropfront/scoring/ripple_life.hpp"
#include "dropfront/values/quantity.hpp"
#include "dropfront/values/year.hpp"

namespace dropfront::problem {
namespace {

using values::Unit;

constexpr double kDay_s = 86400;  // a bare 10 is ten seconds: no life

void read_ambient(const Cursor& cursor, Problem& problem) {
  constexpr Allowed kWeather{-60, 150, false};
  ObjectReader reader(cursor, keys::ambient);
  scoring::Surroundings& s = problem.requirement.surroundings;
  s.ambient_degC.low = quantity_or(problem, reader, "low", Unit::degC, kWeather, 0, "indoor use");
  s.ambient_degC.nominal = quantity_or(problem, reader, "nominal", Unit::degC, kWeather, 25, "indoor use");
  s.ambient_degC.high = quantity_or(problem, reader, "high", Unit::degC, kWeather, 50, "indoor use");
  if (!(s.ambient_degC.low <= s.ambient_degC.nominal) || !(s.ambient_degC.nominal <= s.ambient_degC.high)) {
    throw cursor.error(fmt::format(
        "found low {}, nominal {}, high {} (0, 25, 50 °C unless given); allowed: low <= nominal <= high",
        values::format_quantity(s.ambient_degC.low, Unit::degC),
        values::format_quantity(s.ambient_degC.nominal, Unit::degC),
        values::format_quantity(s.ambient_degC.high, Unit::degC)));
  }
  const double midway = (s.ambient_degC.nominal + s.ambient_degC.high) / 2;
  s.mean_over_life_degC = quantity_or(problem, reader, "mean_over_life", Unit::degC, kWeather, midway,
                                      "midway between nominal and high");
  reader.finish();
  if (!(s.mean_over_life_degC >= s.ambient_degC.low) || !(s.mean_over_life_degC <= s.ambient_degC.high)) {
    throw cursor.error(fmt::format("found mean_over_life {}; allowed: from low {} to high {}",
                                   values::format_quantity(s.mean_over_life_degC, Unit::degC),
                                   values::format_quantity(s.ambient_degC.low, Unit::degC),
                                   values::format_quantity(s.ambient_degC.high, Unit::degC)));
  }
}

}  // namespace

void read_surroundings(const Cursor& surroundings, Problem& problem) {
  ObjectReader reader(surroundings, keys::surroundings);
  scoring::Surroundings& s = problem.requirement.surroundings;
  read_ambient(reader.take_object("ambient"), problem);
  s.enclosure_K_per_W =
      quantity_or(problem, reader, "enclosure", Unit::K_per_W, kNotNegative, 0, "open air: no enclosure");
  s.life_years =
      quantity_or(problem, reader, "life", Unit::second, {kDay_s, 100 * values::kSecondsPerYear, false},
                  10 * values::kSecondsPerYear, "a usual product life") /
      values::kSecondsPerYear;
  if (const auto degree = reader.take("pollution_degree")) {
    s.pollution_degree = static_cast<int>(read_whole(*degree, 1, 3));
  } else {
    note_default(problem, surroundings, "pollution_degree", "2", "household and office (IEC 60664-1)");
  }
  const std::vector<std::string> groups{"I", "II", "IIIa", "IIIb"};
  if (const auto group = reader.take("material_group")) {
    s.material_group = groups[read_word(*group, groups)];
  } else {
    note_default(problem, surroundings, "material_group", "IIIa", "plain board material (IEC 60664-1)");
  }
  std::vector<std::string> laws;
  for (const auto& law : scoring::ripple_life_laws()) laws.emplace_back(law.name);
  if (const auto law = reader.take("ripple_life")) {
    s.ripple_life = scoring::ripple_life_laws()[read_word(*law, laws)].law;
  } else {
    note_default(problem, surroundings, "ripple_life", laws.front(),
                 "the most cautious of the published terms up to the rated current (" +
                     std::string(scoring::ripple_life_laws().front().basis) + ")");
  }
  const auto height_m = quantity_or_none(problem, reader, "max_height", Unit::metre, kPositive, "no check");
  if (height_m) s.max_height_mm = std::round(*height_m * 1e6) / 1e3;  // lengths are kept to 1 um
  reader.finish();
}

void read_connection(const Cursor& connection, Problem& problem) {
  using scoring::ConnectionKind;
  ObjectReader reader(connection, keys::connection);
  scoring::Connection& c = problem.requirement.connection;
  if (const auto kind = reader.take("kind")) {
    constexpr ConnectionKind kinds[] = {ConnectionKind::plug, ConnectionKind::switched,
                                        ConnectionKind::fixed};
    c.kind = kinds[read_word(*kind, {"plug", "switched", "fixed"})];
  } else {
    note_default(problem, connection, "kind", "plug", "the strictest of the three");
  }
  if (const auto plug_ins = reader.take("plug_ins")) {
    c.plug_ins = static_cast<int>(read_whole(*plug_ins, 1, 100000000));
  } else {
    note_default(problem, connection, "plug_ins", "1000", "times under power over the life");
  }
  if (const auto chatter = reader.take("chatter")) {
    c.chatter = static_cast<int>(read_whole(*chatter, 1, 20));
  } else {
    note_default(problem, connection, "chatter", "1",
                 "contacts that close once; a bouncing switch closes several times");
  }
  reader.finish();
}

}  // namespace dropfront::problem
