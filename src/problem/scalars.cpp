#include "dropfront/problem/scalars.hpp"

#include <fmt/format.h>

#include <cmath>

#include "dropfront/values/quantity.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::problem {
namespace {

std::string range_text(values::Unit unit, Allowed allowed) {
  const std::string least = values::format_quantity(allowed.least, unit);
  const std::string above = allowed.least_open ? "above " : "at least ";
  if (allowed.most >= 1e300) return above + least;
  return fmt::format("{}{} and at most {}", above, least, values::format_quantity(allowed.most, unit));
}

}  // namespace

double read_quantity(const Cursor& cursor, values::Unit unit, Allowed allowed) {
  const Node& node = cursor.node();
  if (node.kind != Node::Kind::number && node.kind != Node::Kind::text) {
    throw cursor.wrong(
        fmt::format("{} such as \"{}\"", values::quantity_name(unit), values::example_text(unit)));
  }
  double value = node.number;
  if (node.kind == Node::Kind::text) {
    try {
      value = values::parse_quantity(node.text, unit);
    } catch (const values::ParseError& error) {
      throw cursor.error(error.what());
    }
  }
  const bool high_enough = allowed.least_open ? value > allowed.least : value >= allowed.least;
  if (high_enough && value <= allowed.most) return value;
  // A bare number may have been meant in another unit: say how it was read.
  const bool bare = node.kind == Node::Kind::number && unit != values::Unit::count;
  throw cursor.error(fmt::format("found {}{}; allowed: {}", describe(node),
                                 bare ? ", that is " + values::format_quantity(value, unit) : "",
                                 range_text(unit, allowed)));
}

std::int64_t read_whole(const Cursor& cursor, std::int64_t least, std::int64_t most) {
  const std::string allowed = fmt::format("a whole number from {} to {}", least, most);
  const Node& node = cursor.node();
  if (node.kind != Node::Kind::number) throw cursor.wrong(allowed);
  const double value = node.number;
  if (value != std::floor(value) || !(value >= static_cast<double>(least)) ||
      !(value <= static_cast<double>(most))) {
    throw cursor.wrong(allowed);
  }
  return static_cast<std::int64_t>(value);
}

bool read_truth(const Cursor& cursor) {
  if (cursor.node().kind != Node::Kind::boolean) throw cursor.wrong("true or false");
  return cursor.node().boolean;
}

std::string read_text(const Cursor& cursor) {
  if (cursor.node().kind != Node::Kind::text) throw cursor.wrong("a text in double quotes");
  if (cursor.node().text.empty())
    throw cursor.error("found an empty text; allowed: a text of some characters");
  return cursor.node().text;
}

int read_word(const Cursor& cursor, const std::vector<std::string>& words) {
  const Node& node = cursor.node();
  if (node.kind != Node::Kind::text) throw cursor.wrong(either(words));
  for (std::size_t i = 0; i < words.size(); ++i) {
    if (words[i] == node.text) return static_cast<int>(i);
  }
  throw cursor.error(fmt::format("found {}{}; allowed: {}", describe(node),
                                 values::did_you_mean(node.text, words), either(words)));
}

std::vector<Cursor> read_list(const Cursor& cursor, const std::string& of_what) {
  const Node& node = cursor.node();
  if (node.kind != Node::Kind::list || node.items.empty()) throw cursor.wrong("a list of " + of_what);
  std::vector<Cursor> entries;
  for (std::size_t i = 0; i < node.items.size(); ++i) entries.push_back(cursor.item(i));
  return entries;
}

std::vector<Cursor> read_one_or_list(const Cursor& cursor, const std::string& of_what) {
  if (cursor.node().kind == Node::Kind::list) return read_list(cursor, of_what);
  return {cursor};
}

}  // namespace dropfront::problem
