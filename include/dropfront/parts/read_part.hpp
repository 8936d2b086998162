#pragma once
#include <string>
#include <utility>
#include <vector>

#include "dropfront/parts/field_source.hpp"
#include "dropfront/parts/fields.hpp"

namespace dropfront::parts {

// One cell each; every error names the column, what was found and what is allowed.
double read_number(const FieldSource& source, const Column& column, const RawField& raw);
bool read_truth(const FieldSource& source, const Column& column, const RawField& raw);
std::string read_word(const FieldSource& source, const Column& column, const RawField& raw);

/// Name, sizes, prices, source. `main_text` ("1.5 uF") completes the name of an inline part without one.
PartInfo read_info(const FieldSource& source, Kind kind, bool inline_part, const std::string& main_text);

void refuse_unknown_columns(const FieldSource& source, Kind kind, bool inline_part);
/// When a required column is absent and nothing stands in for it.
void refuse_absent(const FieldSource& source, Kind kind, const Column& column);

/// Value of the main column for names: "470 nF"; empty when the kind has no required number.
std::string main_value_text(const Column& column, double value);

template <class T>
void store(T& part, const Field<T>& field, const FieldSource& source, const RawField& raw) {
  if (const auto number = std::get_if<double T::*>(&field.member)) {
    part.** number = read_number(source, field.column, raw);
  } else if (const auto rating = std::get_if<Rating T::*>(&field.member)) {
    part.** rating = read_number(source, field.column, raw);
  } else if (const auto truth = std::get_if<bool T::*>(&field.member)) {
    part.** truth = read_truth(source, field.column, raw);
  } else {
    std::get<Word<T>>(field.member).set(part, read_word(source, field.column, raw));
  }
}

/// Fills a field from its rule; a rule without an answer leaves it as it is.
template <class T>
void apply_rule(T& part, const Field<T>& field) {
  if (!field.rule) return;
  const Rating value = field.rule(part);
  if (!value) return;
  if (const auto number = std::get_if<double T::*>(&field.member)) part.** number = *value;
  if (const auto rating = std::get_if<Rating T::*>(&field.member)) part.** rating = *value;
}

/// The reader of every kind: columns, defaults, common columns, contradictions.
template <class T>
T read_part(const FieldSource& source, bool inline_part) {
  T part;
  refuse_unknown_columns(source, kind_of<T>(), inline_part);
  std::vector<const Field<T>*> absent;
  std::string main_text;
  for (const Field<T>& field : fields_of<T>()) {
    const auto raw = source.find(field.column.name);
    if (!raw) {
      refuse_absent(source, kind_of<T>(), field.column);
      absent.push_back(&field);
      continue;
    }
    store(part, field, source, *raw);
    const auto number = std::get_if<double T::*>(&field.member);
    if (main_text.empty() && number) main_text = main_value_text(field.column, part.**number);
  }
  for (const Field<T>* field : absent) apply_rule(part, *field);
  part.info = read_info(source, kind_of<T>(), inline_part, main_text);
  if (const auto wrong = contradiction_in(part)) throw source.error(wrong->column, wrong->message);
  return part;
}

std::optional<ColumnValue> info_value(const PartInfo& info, std::string_view name);

template <class T>
std::optional<ColumnValue> field_value(const T& part, std::string_view name) {
  for (const Field<T>& field : fields_of<T>()) {
    if (field.column.name != name) continue;
    if (const auto number = std::get_if<double T::*>(&field.member)) return part.**number;
    if (const auto truth = std::get_if<bool T::*>(&field.member)) return part.**truth;
    if (const auto rating = std::get_if<Rating T::*>(&field.member)) {
      return part.**rating ? std::optional<ColumnValue>(*(part.**rating)) : std::nullopt;
    }
    const std::string text = std::get<Word<T>>(field.member).get(part);
    return text.empty() ? std::nullopt : std::optional<ColumnValue>(text);
  }
  return info_value(part.info, name);
}

}  // namespace dropfront::parts
