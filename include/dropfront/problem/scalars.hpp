#pragma once
#include <cstdint>
#include <string>
#include <vector>

#include "dropfront/problem/cursor.hpp"
#include "dropfront/values/unit.hpp"

namespace dropfront::problem {

/// Numbers allowed at one place; both ends allowed unless stated open.
struct Allowed {
  double least = 0;
  double most = 1e300;
  bool least_open = false;
};
inline constexpr Allowed kAny{-1e300, 1e300, false};
inline constexpr Allowed kPositive{0, 1e300, true};
inline constexpr Allowed kNotNegative{0, 1e300, false};
inline constexpr Allowed kShare{0, 1, false};

/// Each reads one value and refuses every other type with InputError: found, allowed.

/// A number (already in the unit's own scale) or a text with unit.
double read_quantity(const Cursor& cursor, values::Unit unit, Allowed allowed);
/// A JSON number, whole and within [least, most].
std::int64_t read_whole(const Cursor& cursor, std::int64_t least, std::int64_t most);
bool read_truth(const Cursor& cursor);
std::string read_text(const Cursor& cursor);  ///< not empty
/// One of `words`: its index. A near miss is suggested.
int read_word(const Cursor& cursor, const std::vector<std::string>& words);
/// The entries of a list of at least one.
std::vector<Cursor> read_list(const Cursor& cursor, const std::string& of_what);
/// A list, or a single value in place of a list of one.
std::vector<Cursor> read_one_or_list(const Cursor& cursor, const std::string& of_what);

}  // namespace dropfront::problem
