#include "dropfront/parts/part_info.hpp"

#include <cmath>

#include "dropfront/parts/part_columns.hpp"
#include "dropfront/parts/read_part.hpp"

namespace dropfront::parts {
namespace {

constexpr std::int64_t break_quantities[] = {1, 100, 1000, 10000};

std::string price_column(std::int64_t quantity) { return "price_" + std::to_string(quantity); }

Column plain_number(const std::string& name, values::Unit unit, double high) {
  Column column;
  column.name = name;
  column.column_class = ColumnClass::common;
  column.unit = unit;
  column.range = {0, high};
  return column;
}

Column plain_text(const std::string& name) {
  Column column;
  column.name = name;
  column.column_class = ColumnClass::common;
  column.type = ColumnType::word;
  return column;
}

const Column& common_column(std::string_view name) {
  for (const Column& column : common_columns()) {
    if (column.name == name) return column;
  }
  static const Column price = plain_number("price", values::Unit::count, 1e6);
  return price;
}

std::optional<std::int64_t> read_scaled(const FieldSource& source, std::string_view name, double scale) {
  const auto raw = source.find(name);
  if (!raw) return std::nullopt;
  return std::llround(read_number(source, common_column(name), *raw) * scale);
}

}  // namespace

const std::vector<Column>& common_columns() {
  static const std::vector<Column> columns = [] {
    std::vector<Column> list = {plain_text("part")};
    for (const char* size : {"length_mm", "width_mm", "height_mm"}) {
      list.push_back(plain_number(size, values::Unit::millimetre, 1000));
    }
    for (const auto quantity : break_quantities) {
      list.push_back(plain_number(price_column(quantity), values::Unit::count, 1e6));
    }
    list.push_back(plain_text("source"));
    return list;
  }();
  return columns;
}

PartInfo read_info(const FieldSource& source, Kind kind, bool inline_part, const std::string& main_text) {
  PartInfo info;
  if (const auto name = source.find("part")) {
    info.name = name->text;
  } else if (!inline_part) {
    throw source.error("", "part is missing: every row needs a name");
  } else {
    info.name = "inline " + kind_phrase(kind) + (main_text.empty() ? "" : " " + main_text);
  }
  if (const auto text = source.find("source")) info.source = text->text;
  info.length_um = read_scaled(source, "length_mm", 1e3);
  info.width_um = read_scaled(source, "width_mm", 1e3);
  info.height_um = read_scaled(source, "height_mm", 1e3);
  for (const auto quantity : break_quantities) {
    if (const auto price = read_scaled(source, price_column(quantity), 1e6)) {
      info.price_breaks.push_back({quantity, *price});
    }
  }
  if (inline_part && source.find("price")) {
    if (!info.price_breaks.empty()) {
      throw source.error("price", "price and price breaks are both given, give one");
    }
    info.price_breaks.push_back({1, *read_scaled(source, "price", 1e6)});
  }
  return info;
}

std::optional<ColumnValue> info_value(const PartInfo& info, std::string_view name) {
  const auto in_mm = [](const std::optional<std::int64_t>& size_um) -> std::optional<ColumnValue> {
    if (!size_um) return std::nullopt;
    return static_cast<double>(*size_um) / 1e3;
  };
  if (name == "part") return info.name;
  if (name == "source" && !info.source.empty()) return info.source;
  if (name == "length_mm") return in_mm(info.length_um);
  if (name == "width_mm") return in_mm(info.width_um);
  if (name == "height_mm") return in_mm(info.height_um);
  for (const PriceBreak& step : info.price_breaks) {
    if (name == price_column(step.quantity)) return static_cast<double>(step.price_micro) / 1e6;
  }
  return std::nullopt;
}

std::optional<std::int64_t> price_micro_at(const PartInfo& part, std::int64_t volume) {
  if (part.price_breaks.empty()) return std::nullopt;
  std::int64_t price = part.price_breaks.front().price_micro;
  for (const PriceBreak& step : part.price_breaks) {
    if (step.quantity <= volume) price = step.price_micro;
  }
  return price;
}

}  // namespace dropfront::parts
