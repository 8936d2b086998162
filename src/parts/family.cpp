#include "dropfront/parts/family.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/parts/fields.hpp"
#include "dropfront/parts/read_part.hpp"
#include "dropfront/values/quantity.hpp"

namespace dropfront::parts {
namespace {

template <class T>
constexpr double T::*main_member() {
  if constexpr (std::is_same_v<T, Dropper>) return &Dropper::capacitance_F;
  if constexpr (std::is_same_v<T, Resistor>) return &Resistor::resistance_ohm;
  if constexpr (std::is_same_v<T, Clamp>) return &Clamp::voltage_V;
  if constexpr (std::is_same_v<T, Reservoir>) return &Reservoir::capacitance_F;
}

template <class T>
double main_value(const T& part) {
  return part.*main_member<T>();
}

/// Between a (share 0) and b (share 1), exact at both ends; log-log where both are positive and on a scale
/// with a true zero.
double mix(double a, double b, double share, bool ratio_scale = true) {
  if (share <= 0 || a == b) return a;
  if (share >= 1) return b;
  if (ratio_scale && a > 0 && b > 0) return std::exp(std::log(a) + share * (std::log(b) - std::log(a)));
  return a + share * (b - a);
}

std::optional<std::int64_t> mix(const std::optional<std::int64_t>& a, const std::optional<std::int64_t>& b,
                                double share) {
  if (!a || !b) return std::nullopt;
  return std::llround(mix(static_cast<double>(*a), static_cast<double>(*b), share));
}

std::vector<PriceBreak> mix(const PartInfo& a, const PartInfo& b, double share) {
  std::vector<PriceBreak> breaks;
  if (a.price_breaks.empty() || b.price_breaks.empty()) return breaks;
  std::vector<std::int64_t> quantities;
  for (const PartInfo* info : {&a, &b}) {
    for (const PriceBreak& step : info->price_breaks) quantities.push_back(step.quantity);
  }
  std::sort(quantities.begin(), quantities.end());
  quantities.erase(std::unique(quantities.begin(), quantities.end()), quantities.end());
  for (const std::int64_t quantity : quantities) {
    breaks.push_back({quantity, *mix(price_micro_at(a, quantity), price_micro_at(b, quantity), share)});
  }
  return breaks;
}

template <class T>
Rating number_of(const T& part, const Field<T>& field) {
  if (const auto number = std::get_if<double T::*>(&field.member)) return part.**number;
  if (const auto rating = std::get_if<Rating T::*>(&field.member)) return part.**rating;
  return std::nullopt;
}

template <class T>
void set_number(T& part, const Field<T>& field, const Rating& value) {
  if (const auto number = std::get_if<double T::*>(&field.member)) part.** number = value.value_or(0);
  if (const auto rating = std::get_if<Rating T::*>(&field.member)) part.** rating = value;
}

template <class T>
bool follows_rule(const T& part, const Field<T>& field) {
  return field.rule && field.rule(part) == number_of(part, field);
}

/// Bounds keep their distance from the nominal voltage as a ratio, else a clamp far from its rows would carry
/// their bounds.
void scale_bounds(Clamp& part, const Clamp& low, const Clamp& high, double share) {
  const auto scaled = [&](double Clamp::*bound) {
    return part.voltage_V * mix(low.*bound / low.voltage_V, high.*bound / high.voltage_V, share);
  };
  const auto symmetric = [](const Clamp& row) {
    return row.voltage_min_V == row.voltage_V * (1 - row.tolerance) &&
           row.voltage_max_V == row.voltage_V * (1 + row.tolerance);
  };
  part.tolerance = mix(low.tolerance, high.tolerance, share);
  if (symmetric(low) && symmetric(high)) {
    part.voltage_min_V = part.voltage_V * (1 - part.tolerance);
    part.voltage_max_V = part.voltage_V * (1 + part.tolerance);
  } else {
    part.voltage_min_V = scaled(&Clamp::voltage_min_V);
    part.voltage_max_V = scaled(&Clamp::voltage_max_V);
  }
}

template <class T>
T between(const T& low, const T& high, double value) {
  const double whole = std::log(main_value(high)) - std::log(main_value(low));
  const double share =
      whole > 0 ? std::clamp((std::log(value) - std::log(main_value(low))) / whole, 0.0, 1.0) : 0.0;
  T part = share < 0.5 ? low : high;
  part.*main_member<T>() = value;
  if constexpr (std::is_same_v<T, Clamp>) scale_bounds(part, low, high, share);
  for (const Field<T>& field : fields_of<T>()) {
    const auto member = std::get_if<double T::*>(&field.member);
    if (member && *member == main_member<T>()) continue;
    if constexpr (std::is_same_v<T, Clamp>) {
      const std::string& name = field.column.name;
      if (name == "tolerance" || name == "voltage_min" || name == "voltage_max") continue;
    }
    if (follows_rule(low, field) && follows_rule(high, field)) {
      set_number(part, field, field.rule(part));
      continue;
    }
    const Rating a = number_of(low, field);
    const Rating b = number_of(high, field);
    if (field.column.type != ColumnType::number) continue;
    const bool ratio_scale = field.column.unit != values::Unit::degC;
    set_number(part, field, a && b ? Rating(mix(*a, *b, share, ratio_scale)) : Rating());
  }
  part.info.length_um = mix(low.info.length_um, high.info.length_um, share);
  part.info.width_um = mix(low.info.width_um, high.info.width_um, share);
  part.info.height_um = mix(low.info.height_um, high.info.height_um, share);
  part.info.price_breaks = mix(low.info, high.info, share);
  return part;
}

template <class T>
std::vector<T> expand(std::vector<const T*> rows, values::Series series, double from, double to) {
  std::vector<T> parts;
  if (rows.empty()) return parts;
  std::stable_sort(rows.begin(), rows.end(),
                   [](const T* a, const T* b) { return main_value(*a) < main_value(*b); });
  const values::Unit unit = fields_of<T>().front().column.unit;  // the main value leads each table
  for (const double value : values::preferred_between(series, from, to)) {
    // The last row not above the value and the first row above it; the ends stand for what lies beyond.
    const auto above =
        std::find_if(rows.begin(), rows.end(), [&](const T* row) { return main_value(*row) > value; });
    const T* high = above == rows.end() ? rows.back() : *above;
    const T* low = above == rows.begin() ? rows.front() : *std::prev(above);
    T part = between(*low, *high, value);
    part.info.name += ' ';
    part.info.name += values::format_quantity(value, unit);
    parts.push_back(std::move(part));
  }
  return parts;
}

}  // namespace

Dropper interpolate(const Dropper& low, const Dropper& high, double capacitance_F) {
  return between(low, high, capacitance_F);
}
Resistor interpolate(const Resistor& low, const Resistor& high, double resistance_ohm) {
  return between(low, high, resistance_ohm);
}
Clamp interpolate(const Clamp& low, const Clamp& high, double voltage_V) {
  return between(low, high, voltage_V);
}
Reservoir interpolate(const Reservoir& low, const Reservoir& high, double capacitance_F) {
  return between(low, high, capacitance_F);
}

std::vector<Dropper> expand_family(const std::vector<const Dropper*>& rows, values::Series series,
                                   double from_F, double to_F) {
  return expand(rows, series, from_F, to_F);
}
std::vector<Resistor> expand_family(const std::vector<const Resistor*>& rows, values::Series series,
                                    double from_ohm, double to_ohm) {
  return expand(rows, series, from_ohm, to_ohm);
}
std::vector<Clamp> expand_family(const std::vector<const Clamp*>& rows, values::Series series, double from_V,
                                 double to_V) {
  return expand(rows, series, from_V, to_V);
}
std::vector<Reservoir> expand_family(const std::vector<const Reservoir*>& rows, values::Series series,
                                     double from_F, double to_F) {
  return expand(rows, series, from_F, to_F);
}

}  // namespace dropfront::parts
