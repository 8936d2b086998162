#pragma once
#include <optional>
#include <string>
#include <utility>
#include <variant>
#include <vector>

#include "dropfront/parts/columns.hpp"

namespace dropfront::parts {

/// A word column's way into its part: enumerations and lists of words are text outside.
template <class T>
struct Word {
  std::string (*get)(const T&);
  void (*set)(T&, const std::string&);
};

/// One column tied to its place in the part. Reading, writing, filtering and interpolation all go through
/// these, so a new column is one line in one table.
template <class T>
struct Field {
  Column column;
  std::variant<double T::*, Rating T::*, bool T::*, Word<T>> member;
  /// Default that depends on other columns; a field is filled after those listed before it.
  Rating (*rule)(const T&) = nullptr;
};

/// The table of a kind, main value first among the numbers. Defined beside each kind.
template <class T>
const std::vector<Field<T>>& fields_of();

/// Two columns of one part that cannot both be true.
struct Contradiction {
  std::string column;
  std::string message;
};

/// First contradiction within a part whose columns are each in range. Defined beside each kind.
template <class T>
std::optional<Contradiction> contradiction_in(const T& part);

template <class T>
constexpr Kind kind_of() {
  using std::is_same_v;
  if constexpr (is_same_v<T, Dropper>) return Kind::dropper;
  if constexpr (is_same_v<T, Resistor>) return Kind::resistor;
  if constexpr (is_same_v<T, Clamp>) return Kind::clamp;
  if constexpr (is_same_v<T, Reservoir>) return Kind::reservoir;
  if constexpr (is_same_v<T, Rectifier>) return Kind::rectifier;
  if constexpr (is_same_v<T, OutputStage>) return Kind::output_stage;
  if constexpr (is_same_v<T, Varistor>) return Kind::varistor;
  if constexpr (is_same_v<T, Fuse>) return Kind::fuse;
  if constexpr (is_same_v<T, Thyristor>) return Kind::thyristor;
  if constexpr (is_same_v<T, Ceramic>) return Kind::ceramic;
}

// The forms a table is written in. Bounds are those beyond which a number is a slip of units.

constexpr Range above_0(double high) { return {0, high, true, false}; }
constexpr Range from_0(double high) { return {0, high, false, false}; }
inline constexpr Range below_1 = {0, 1, false, true};
inline constexpr Range temperatures_degC = {-100, 500, false, false};

template <class T>
Field<T> required(const char* name, values::Unit unit, double T::*member, Range range) {
  Column column;
  column.name = name;
  column.column_class = ColumnClass::required;
  column.unit = unit;
  column.range = range;
  return {std::move(column), member, nullptr};
}

template <class T>
Field<T> rating(const char* name, values::Unit unit, Rating T::*member, Range range) {
  Column column;
  column.name = name;
  column.unit = unit;
  column.range = range;
  return {std::move(column), member, nullptr};
}

/// A number with a documented default; `rule` where it depends on other columns.
template <class T, class M>
Field<T> property(const char* name, values::Unit unit, M T::*member, Range range, const char* default_text,
                  const char* reason, Rating (*rule)(const T&) = nullptr) {
  Column column;
  column.name = name;
  column.column_class = ColumnClass::property;
  column.unit = unit;
  column.range = range;
  column.default_text = default_text;
  column.default_reason = reason;
  return {std::move(column), member, rule};
}

template <class T>
Field<T> truth(const char* name, bool T::*member, const char* default_text, const char* reason) {
  Column column;
  column.name = name;
  column.column_class = ColumnClass::property;
  column.type = ColumnType::truth;
  column.default_text = default_text;
  column.default_reason = reason;
  return {std::move(column), member, nullptr};
}

template <class T>
Field<T> word(const char* name, ColumnClass column_class, Word<T> access, std::vector<std::string> words) {
  Column column;
  column.name = name;
  column.column_class = column_class;
  column.type = ColumnType::word;
  column.words = std::move(words);
  return {std::move(column), access, nullptr};
}

}  // namespace dropfront::parts
