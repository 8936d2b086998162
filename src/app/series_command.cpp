#include <fmt/core.h>

#include <array>
#include <ostream>

#include "dropfront/app/commands.hpp"
#include "dropfront/values/input_error.hpp"
#include "dropfront/values/quantity.hpp"
#include "dropfront/values/series.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::app {

namespace {

using values::Unit;

struct Preferred {
  double value;
  Unit unit;
};

/// The first kind of quantity the text is. A letter code of the small prefixes alone ("470n", "1u5") is a
/// capacitance in the trade, one of the large ones a resistance.
Preferred read_value(const std::string& text) {
  const bool small = text.find_first_of("pnu") != std::string::npos || text.find("µ") != std::string::npos;
  const std::array<Unit, 5> order{Unit::count, small ? Unit::farad : Unit::ohm,
                                  small ? Unit::ohm : Unit::farad, Unit::volt, Unit::ampere};
  for (const Unit unit : order) {
    try {
      const double value = values::parse_quantity(text, unit);
      if (value > 0) return {value, unit};
      break;
    } catch (const values::ParseError&) {
      continue;  // another kind may fit
    }
  }
  throw values::InputError(
      "series", "",
      fmt::format("found \"{}\"; a value above zero is allowed, such as 4.7k, 470n, R47 or 52", text));
}

}  // namespace

ExitStatus series_command(const SeriesArguments& arguments, Console& console) {
  const auto series = values::series_named(arguments.series);
  if (!series) {
    std::string known;
    for (const auto& name : values::series_names()) known += (known.empty() ? "" : ", ") + name;
    throw values::InputError(
        "--in", "",
        fmt::format("found \"{}\"{}; allowed: {}", arguments.series,
                    values::did_you_mean(arguments.series, values::series_names()), known));
  }
  const auto [value, unit] = read_value(arguments.value);
  const Unit kind = unit;
  const auto text = [kind](double v) { return values::format_quantity(v, kind); };
  console.out << fmt::format("{} in {} (IEC 60063)\n", text(value), values::series_name(*series))
              << fmt::format("  next lower   {}\n", text(values::next_lower_preferred(*series, value)))
              << fmt::format("  nearest      {}\n", text(values::nearest_preferred(*series, value)))
              << fmt::format("  next higher  {}\n", text(values::next_higher_preferred(*series, value)));
  return ExitStatus::done;
}

}  // namespace dropfront::app
