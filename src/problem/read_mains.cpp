#include <fmt/format.h>

#include <cmath>
#include <set>

#include "dropfront/problem/defaults.hpp"
#include "dropfront/problem/sections.hpp"
#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/values/quantity.hpp"

namespace dropfront::problem {
namespace {

using values::Unit;

constexpr double kPi = 3.14159265358979323846;

values::Spread read_spread(ObjectReader& supply, std::string_view key, Unit unit, Allowed allowed,
                           Problem& problem) {
  const Cursor cursor = supply.require(key);
  if (cursor.node().kind != Node::Kind::object) {
    const double value = read_quantity(cursor, unit, allowed);
    note_default(problem, cursor, "low", values::format_quantity(value, unit), "a single value is all three");
    note_default(problem, cursor, "high", values::format_quantity(value, unit),
                 "a single value is all three");
    return {value, value, value};
  }
  ObjectReader reader(cursor, keys::spread);
  values::Spread spread;
  spread.low = read_quantity(reader.require("low"), unit, allowed);
  spread.nominal = read_quantity(reader.require("nominal"), unit, allowed);
  spread.high = read_quantity(reader.require("high"), unit, allowed);
  reader.finish();
  if (!(spread.low <= spread.nominal) || !(spread.nominal <= spread.high)) {
    throw cursor.error(fmt::format("found low {}, nominal {}, high {}; allowed: low <= nominal <= high",
                                   values::format_quantity(spread.low, unit),
                                   values::format_quantity(spread.nominal, unit),
                                   values::format_quantity(spread.high, unit)));
  }
  return spread;
}

circuit::Harmonic read_harmonic(const Cursor& cursor, Problem& problem) {
  ObjectReader reader(cursor, keys::harmonic);
  circuit::Harmonic harmonic;
  harmonic.order = static_cast<int>(read_whole(reader.require("order"), 2, 50));
  const Cursor percent = reader.require("percent");
  // The only kind of key that holds percent: a bare 3 means 3 %.
  harmonic.share = percent.node().kind == Node::Kind::number
                       ? read_quantity(percent, Unit::count, {0, 100, false}) / 100
                       : read_quantity(percent, Unit::share, kShare);
  harmonic.phase_rad =
      quantity_or(problem, reader, "phase_deg", Unit::degree, {-360, 360, false}, 0, "in phase") * kPi / 180;
  reader.finish();
  return harmonic;
}

/// Above the first a caution, above the second no supply that harmonics describe: three odd harmonics of a
/// square wave reach 1.85, and its edges would go on adding.
constexpr double kUnusualCurrent = 1.3;
constexpr double kSquareCurrent = 1.75;

void judge_waveform(const Cursor& cursor, const scoring::Supply& supply, Problem& problem) {
  const double factor = scoring::current_factor(supply.harmonics);
  if (!(factor <= kSquareCurrent)) {
    throw cursor.error(
        fmt::format("these harmonics raise the dropper's r.m.s. current to {:.2f} times a sine's and the "
                    "series resistor's "
                    "loss to {:.1f} times; allowed: up to {} times. A square or stepped wave (k = 3, 5, 7 "
                    "... at 1/k) has "
                    "edges that no list of harmonics holds: a capacitor dropper does not belong on it",
                    factor, factor * factor, kSquareCurrent));
  }
  if (!(factor <= kUnusualCurrent)) {
    problem.cautions.push_back(
        fmt::format("{}: these harmonics raise the dropper's r.m.s. current to {:.2f} times a sine's (its "
                    "losses to {:.1f} "
                    "times; a public line stays below {}): check slew and resistor loss on the real waveform",
                    cursor.dotted(), factor, factor * factor, kUnusualCurrent));
  }
}

scoring::Supply read_supply(const Cursor& cursor, bool named, Problem& problem) {
  ObjectReader reader(cursor, keys::supply);
  scoring::Supply supply;
  if (named) {
    supply.name = read_text(reader.require("name"));
  } else if (const auto name = reader.take("name")) {
    supply.name = read_text(*name);
  }
  supply.voltage_Vrms = read_spread(reader, "voltage", Unit::volt, {0, 1000, true}, problem);
  supply.frequency_Hz = read_spread(reader, "frequency", Unit::hertz, {10, 1000, false}, problem);
  if (const auto harmonics = reader.take("harmonics")) {
    std::set<int> orders;
    for (const Cursor& entry : read_list(*harmonics, "harmonics {\"order\", \"percent\", \"phase_deg\"}")) {
      supply.harmonics.push_back(read_harmonic(entry, problem));
      if (!orders.insert(supply.harmonics.back().order).second) {
        throw entry.error(
            fmt::format("found order {} twice; allowed: each order once", supply.harmonics.back().order));
      }
    }
    supply.harmonics_given = true;
    judge_waveform(*harmonics, supply, problem);
  } else {
    note_default(problem, cursor, "harmonics",
                 "none at nominal; third, 3 %, flat-topped or peaked at the ends",
                 "the waveform is not known: the lean corner takes it flat-topped, the rich corners peaked");
  }
  if (const auto phases = reader.take("phases")) {
    supply.phases_as_given = read_word(*phases, {"as given", "worst"}) == 0;
    if (supply.phases_as_given && !supply.harmonics_given) {
      throw phases->error("found \"as given\" without harmonics; give \"harmonics\" or leave \"phases\" out");
    }
  } else if (supply.harmonics_given) {
    note_default(problem, cursor, "phases", "worst",
                 "each corner takes the phase or its opposite, whichever is worse there");
  }
  reader.finish();
  return supply;
}

}  // namespace

void read_mains(const Cursor& mains, Problem& problem) {
  auto& supplies = problem.requirement.supplies;
  if (mains.node().kind != Node::Kind::list) {
    supplies.push_back(read_supply(mains, false, problem));
    return;
  }
  std::set<std::string> names;
  for (const Cursor& entry : read_list(mains, "supplies {\"name\", \"voltage\", \"frequency\"}")) {
    supplies.push_back(read_supply(entry, true, problem));
    if (!names.insert(supplies.back().name).second) {
      throw entry.error(
          fmt::format("found two supplies named \"{}\"; allowed: unique names", supplies.back().name));
    }
  }
}

}  // namespace dropfront::problem
