#pragma once
#include <functional>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/parts/columns.hpp"
#include "dropfront/problem/cursor.hpp"

namespace dropfront::problem {

/// One condition of a slot's "where": a column equals a value, or lies in a range (ends included).
struct Condition {
  const parts::Column* column = nullptr;
  std::optional<double> least, most;  ///< numbers; equality is least = most
  std::optional<bool> truth;
  std::optional<std::string> word;
};

/// Reads {"column": value or {"min", "max"}, ...}. Refuses columns the kind does not have.
std::vector<Condition> read_where(const Cursor& where, parts::Kind kind);

/// Whether a part's column value meets the condition. A value that is not given meets none. Numbers are
/// compared within 1e-9 relative, so that 0.47 uF and an interpolated 470 nF are the same.
bool meets(const Condition& condition, const std::optional<parts::ColumnValue>& value);

}  // namespace dropfront::problem
