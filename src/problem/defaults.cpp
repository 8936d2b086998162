#include "dropfront/problem/defaults.hpp"

#include "dropfront/values/quantity.hpp"

namespace dropfront::problem {

void note_default(Problem& problem, const Cursor& object, std::string_view key, const std::string& value,
                  const std::string& reason) {
  const std::string way = object.dotted();
  problem.defaults.push_back({way.empty() ? std::string(key) : way + "." + std::string(key), value, reason});
}

double quantity_or(Problem& problem, ObjectReader& reader, std::string_view key, values::Unit unit,
                   Allowed allowed, double fallback, const std::string& reason) {
  if (const auto given = reader.take(key)) return read_quantity(*given, unit, allowed);
  note_default(problem, reader.object(), key, values::format_quantity(fallback, unit), reason);
  return fallback;
}

std::optional<double> quantity_or_none(Problem& problem, ObjectReader& reader, std::string_view key,
                                       values::Unit unit, Allowed allowed, const std::string& reason) {
  if (const auto given = reader.take(key)) return read_quantity(*given, unit, allowed);
  note_default(problem, reader.object(), key, "none", reason);
  return std::nullopt;
}

}  // namespace dropfront::problem
