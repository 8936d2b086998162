#include "dropfront/problem/part_filter.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <sstream>

#include "dropfront/problem/scalars.hpp"
#include "dropfront/values/quantity.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::problem {
namespace {

Condition read_number(const Cursor& cursor, const parts::Column& column) {
  Condition condition{&column, {}, {}, {}, {}};
  if (cursor.node().kind != Node::Kind::object) {
    condition.least = condition.most = read_quantity(cursor, column.unit, kAny);
    return condition;
  }
  ObjectReader reader(cursor, keys::range);
  if (const auto least = reader.take("min")) condition.least = read_quantity(*least, column.unit, kAny);
  if (const auto most = reader.take("max")) condition.most = read_quantity(*most, column.unit, kAny);
  reader.finish();
  if (!condition.least && !condition.most)
    throw cursor.error("found an empty range; give \"min\", \"max\" or both");
  if (condition.least && condition.most && !(*condition.least <= *condition.most)) {
    throw cursor.error(fmt::format("found min {} and max {}; allowed: min <= max",
                                   values::format_quantity(*condition.least, column.unit),
                                   values::format_quantity(*condition.most, column.unit)));
  }
  return condition;
}

Condition read_condition(const Cursor& cursor, const parts::Column& column) {
  Condition condition{&column, {}, {}, {}, {}};
  switch (column.type) {
    case parts::ColumnType::number:
      return read_number(cursor, column);
    case parts::ColumnType::truth:
      condition.truth = read_truth(cursor);
      return condition;
    case parts::ColumnType::word:
      condition.word =
          column.words.empty() ? read_text(cursor) : column.words[read_word(cursor, column.words)];
      return condition;
  }
  return condition;
}

/// A column of several words says each of them.
bool says(const parts::Column& column, const std::string& value, const std::string& word) {
  if (!column.several_words) return value == word;
  std::istringstream words(value);
  for (std::string one; words >> one;) {
    if (one == word) return true;
  }
  return false;
}

}  // namespace

std::vector<Condition> read_where(const Cursor& where, parts::Kind kind) {
  const Node& node = where.node();
  if (node.kind != Node::Kind::object) throw where.wrong("an object {} of columns and values");
  std::vector<Condition> conditions;
  for (std::size_t i = 0; i < node.keys.size(); ++i) {
    const parts::Column* column = parts::find_column(kind, node.keys[i].name);
    if (!column) {
      const auto names = parts::column_names(kind);
      throw where.member(i).error_at(
          node.keys[i].place,
          fmt::format("{} has no column \"{}\"{}; allowed: {}", parts::list_file_name(kind),
                      node.keys[i].name, values::did_you_mean(node.keys[i].name, names), either(names)));
    }
    conditions.push_back(read_condition(where.member(i), *column));
  }
  return conditions;
}

bool meets(const Condition& condition, const std::optional<parts::ColumnValue>& value) {
  if (!value) return false;
  if (condition.truth)
    return std::holds_alternative<bool>(*value) && std::get<bool>(*value) == *condition.truth;
  if (condition.word) {
    return std::holds_alternative<std::string>(*value) &&
           says(*condition.column, std::get<std::string>(*value), *condition.word);
  }
  if (!std::holds_alternative<double>(*value)) return false;
  const double number = std::get<double>(*value);
  const double slack = 1e-9 * std::abs(number);
  return !(condition.least && !(number >= *condition.least - slack)) &&
         !(condition.most && !(number <= *condition.most + slack));
}

}  // namespace dropfront::problem
