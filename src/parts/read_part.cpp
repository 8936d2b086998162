#include "dropfront/parts/read_part.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <sstream>

#include "dropfront/parts/part_columns.hpp"
#include "dropfront/values/quantity.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::parts {
namespace {

std::string listed(const std::vector<std::string>& words) {
  std::string text;
  for (const std::string& word : words) text += (text.empty() ? "" : ", ") + word;
  return text;
}

}  // namespace

double read_number(const FieldSource& source, const Column& column, const RawField& raw) {
  double value = 0;
  try {
    value = values::parse_quantity(raw.text, column.unit);
  } catch (const values::ParseError& error) {
    throw source.error(column.name, fmt::format("{} {}", column.name, error.what()));
  }
  const Range& range = column.range;
  const bool low_ok = range.low_open ? value > range.low : value >= range.low;
  const bool high_ok = range.high_open ? value < range.high : value <= range.high;
  if (low_ok && high_ok) return value;
  throw source.error(column.name, fmt::format("{} '{}' is out of range, allowed is {}", column.name, raw.text,
                                              range_text(column)));
}

bool read_truth(const FieldSource& source, const Column& column, const RawField& raw) {
  for (const char* yes : {"true", "yes"}) {
    if (raw.text == yes) return true;
  }
  for (const char* no : {"false", "no"}) {
    if (raw.text == no) return false;
  }
  throw source.error(column.name,
                     fmt::format("{} '{}' is not allowed, write true or false", column.name, raw.text));
}

std::string read_word(const FieldSource& source, const Column& column, const RawField& raw) {
  std::vector<std::string> found = {raw.text};
  if (column.several_words) {
    found.clear();
    std::istringstream words(raw.text);
    for (std::string word; words >> word;) found.push_back(word);
  }
  for (const std::string& word : found) {
    if (column.words.empty()) break;
    if (std::find(column.words.begin(), column.words.end(), word) != column.words.end()) continue;
    throw source.error(column.name,
                       fmt::format("{} '{}' is not allowed, write {}{}", column.name, word,
                                   listed(column.words), values::did_you_mean(word, column.words)));
  }
  return raw.text;
}

void refuse_unknown_columns(const FieldSource& source, Kind kind, bool inline_part) {
  std::vector<std::string> known = column_names(kind);
  if (inline_part) known.push_back("price");
  for (const std::string& name : source.names()) {
    if (std::find(known.begin(), known.end(), name) != known.end()) continue;
    throw source.error(name, fmt::format("{} has no column '{}'{}", kind_with_article(kind), name,
                                         values::did_you_mean(name, known)));
  }
}

void refuse_absent(const FieldSource& source, Kind kind, const Column& column) {
  if (column.column_class != ColumnClass::required) return;
  const bool stands_in = !column.unless.empty() &&
                         std::all_of(column.unless.begin(), column.unless.end(),
                                     [&](const auto& other) { return source.find(other).has_value(); });
  if (stands_in) return;
  std::string such_as(values::example_text(column.unit));
  if (column.type == ColumnType::word) such_as = listed(column.words);
  const std::string instead = column.unless.empty() ? "" : " (or " + listed(column.unless) + ")";
  throw source.error("", fmt::format("{} is missing: every {} needs it{}, such as {}", column.name,
                                     kind_phrase(kind), instead, such_as));
}

std::string main_value_text(const Column& column, double value) {
  if (column.column_class != ColumnClass::required) return "";
  return values::format_quantity(value, column.unit);
}

}  // namespace dropfront::parts
