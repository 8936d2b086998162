#pragma once
#include <array>
#include <optional>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

#include "dropfront/parts/catalogue.hpp"
#include "dropfront/values/unit.hpp"

namespace dropfront::parts {

enum class Kind {
  dropper,
  resistor,
  clamp,
  reservoir,
  rectifier,
  output_stage,
  varistor,
  fuse,
  thyristor,
  ceramic
};

inline constexpr std::array<Kind, 10> all_kinds = {
    Kind::dropper,      Kind::resistor, Kind::clamp, Kind::reservoir, Kind::rectifier,
    Kind::output_stage, Kind::varistor, Kind::fuse,  Kind::thyristor, Kind::ceramic};

/// "dropper", "output_stage", ...
std::string_view kind_name(Kind kind);
/// "droppers.csv", "output_stages.csv", ...
std::string_view list_file_name(Kind kind);

enum class ColumnClass {
  required,  ///< refused when absent
  property,  ///< takes the documented default when absent
  rating,    ///< absent: not given, its check is null
  common     ///< name, sizes, prices, source: absent size or price makes that objective null
};

enum class ColumnType { number, truth, word };

/// Allowed numbers of a column, in the column's unit.
struct Range {
  double low = 0;
  double high = 1;
  bool low_open = false;  ///< low itself refused
  bool high_open = false;
};

/// One column of a parts list, which is also one key of an inline part.
struct Column {
  std::string name;
  ColumnClass column_class = ColumnClass::rating;
  ColumnType type = ColumnType::number;
  values::Unit unit = values::Unit::count;  ///< numbers only
  Range range;                              ///< numbers only
  std::vector<std::string> words;           ///< words only: those allowed; empty: any text
  bool several_words = false;               ///< words only: a list, separated by spaces
  std::string default_text;                 ///< property: the default as a person would write it
  std::string default_reason;               ///< property: where the default comes from
  std::vector<std::string> unless;          ///< required: not needed when all of these are given
  std::string required_for;                 ///< needed when the column `kind` holds this word
};

/// "more than 0 and at most 1 mF": the range in words.
std::string range_text(const Column& column);

/// All columns of a kind, common ones last. `price` (inline parts only) is not among them.
const std::vector<Column>& columns_of(Kind kind);
/// Null when the kind has no such column.
const Column* find_column(Kind kind, std::string_view name);
std::vector<std::string> column_names(Kind kind);

/// A part's value in the column's unit (numbers), as read or as defaulted.
using ColumnValue = std::variant<double, bool, std::string>;

/// Empty: not given (or no such column). Inverse of the reader: a part written column by column from these
/// values reads back the same.
std::optional<ColumnValue> column_value(const Dropper& part, std::string_view name);
std::optional<ColumnValue> column_value(const Resistor& part, std::string_view name);
std::optional<ColumnValue> column_value(const Clamp& part, std::string_view name);
std::optional<ColumnValue> column_value(const Reservoir& part, std::string_view name);
std::optional<ColumnValue> column_value(const Rectifier& part, std::string_view name);
std::optional<ColumnValue> column_value(const OutputStage& part, std::string_view name);
std::optional<ColumnValue> column_value(const Varistor& part, std::string_view name);
std::optional<ColumnValue> column_value(const Fuse& part, std::string_view name);
std::optional<ColumnValue> column_value(const Thyristor& part, std::string_view name);
std::optional<ColumnValue> column_value(const Ceramic& part, std::string_view name);

}  // namespace dropfront::parts
