#include "dropfront/parts/columns.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "dropfront/parts/fields.hpp"
#include "dropfront/parts/part_columns.hpp"
#include "dropfront/values/quantity.hpp"

namespace dropfront::parts {
namespace {

struct KindNames {
  std::string_view name;
  std::string_view file;
};

constexpr KindNames names_of(Kind kind) {
  switch (kind) {
    case Kind::dropper:
      return {"dropper", "droppers.csv"};
    case Kind::resistor:
      return {"resistor", "resistors.csv"};
    case Kind::clamp:
      return {"clamp", "clamps.csv"};
    case Kind::reservoir:
      return {"reservoir", "reservoirs.csv"};
    case Kind::rectifier:
      return {"rectifier", "rectifiers.csv"};
    case Kind::output_stage:
      return {"output_stage", "output_stages.csv"};
    case Kind::varistor:
      return {"varistor", "varistors.csv"};
    case Kind::fuse:
      return {"fuse", "fuses.csv"};
    case Kind::thyristor:
      return {"thyristor", "thyristors.csv"};
    case Kind::ceramic:
      return {"ceramic", "ceramics.csv"};
  }
  return {"", ""};
}

template <class T>
std::vector<Column> columns_for() {
  std::vector<Column> columns;
  for (const Field<T>& field : fields_of<T>()) columns.push_back(field.column);
  columns.insert(columns.end(), common_columns().begin(), common_columns().end());
  return columns;
}

}  // namespace

std::string_view kind_name(Kind kind) { return names_of(kind).name; }
std::string_view list_file_name(Kind kind) { return names_of(kind).file; }

std::string kind_phrase(Kind kind) {
  std::string phrase(kind_name(kind));
  std::replace(phrase.begin(), phrase.end(), '_', ' ');
  return phrase;
}

std::string kind_with_article(Kind kind) {
  return (kind == Kind::output_stage ? "an " : "a ") + kind_phrase(kind);
}

const std::vector<Column>& columns_of(Kind kind) {
  static const std::array<std::vector<Column>, all_kinds.size()> tables = {
      columns_for<Dropper>(),   columns_for<Resistor>(),    columns_for<Clamp>(),    columns_for<Reservoir>(),
      columns_for<Rectifier>(), columns_for<OutputStage>(), columns_for<Varistor>(), columns_for<Fuse>(),
      columns_for<Thyristor>(), columns_for<Ceramic>()};
  return tables[static_cast<std::size_t>(kind)];
}

const Column* find_column(Kind kind, std::string_view name) {
  for (const Column& column : columns_of(kind)) {
    if (column.name == name) return &column;
  }
  return nullptr;
}

std::vector<std::string> column_names(Kind kind) {
  std::vector<std::string> names;
  for (const Column& column : columns_of(kind)) names.push_back(column.name);
  return names;
}

std::string range_text(const Column& column) {
  const Range& range = column.range;
  return fmt::format("{} {} and {} {}", range.low_open ? "more than" : "at least",
                     values::format_quantity(range.low, column.unit),
                     range.high_open ? "less than" : "at most",
                     values::format_quantity(range.high, column.unit));
}

}  // namespace dropfront::parts
