#include "dropfront/report/part_columns.hpp"

namespace dropfront::report {

namespace {

/// The columns of the kind's own table that hold something. Where a resistor may stand is no property of its.
template <typename Part>
Columns given_columns(parts::Kind kind, const Part& part) {
  Columns columns;
  for (const parts::Column& column : parts::columns_of(kind)) {
    if (column.column_class == parts::ColumnClass::common || column.name == "slots") continue;
    if (auto value = parts::column_value(part, column.name))
      columns.emplace_back(column.name, *std::move(value));
  }
  return columns;
}

}  // namespace

std::string_view kind_name(parts::StageKind kind) {
  switch (kind) {
    case parts::StageKind::linear:
      return "linear";
    case parts::StageKind::step_down:
      return "step-down";
    case parts::StageKind::direct:
      break;
  }
  return "direct";
}

Columns electrical_columns(const parts::Dropper& part) { return given_columns(parts::Kind::dropper, part); }
Columns electrical_columns(const parts::Resistor& part) { return given_columns(parts::Kind::resistor, part); }
Columns electrical_columns(const parts::Clamp& part) { return given_columns(parts::Kind::clamp, part); }
Columns electrical_columns(const parts::Reservoir& part) {
  return given_columns(parts::Kind::reservoir, part);
}
Columns electrical_columns(const parts::Rectifier& part) {
  return given_columns(parts::Kind::rectifier, part);
}
Columns electrical_columns(const parts::OutputStage& part) {
  return given_columns(parts::Kind::output_stage, part);
}
Columns electrical_columns(const parts::Varistor& part) { return given_columns(parts::Kind::varistor, part); }
Columns electrical_columns(const parts::Fuse& part) { return given_columns(parts::Kind::fuse, part); }
Columns electrical_columns(const parts::Thyristor& part) {
  return given_columns(parts::Kind::thyristor, part);
}
Columns electrical_columns(const parts::Ceramic& part) { return given_columns(parts::Kind::ceramic, part); }

Columns common_columns(const parts::PartInfo& info) {
  Columns columns;
  const auto size = [&columns](const char* name, const std::optional<std::int64_t>& um) {
    if (um) columns.emplace_back(name, static_cast<double>(*um) / 1000);
  };
  size("length_mm", info.length_um);
  size("width_mm", info.width_um);
  size("height_mm", info.height_um);
  for (const auto& step : info.price_breaks)
    columns.emplace_back("price_" + std::to_string(step.quantity),
                         static_cast<double>(step.price_micro) / 1e6);
  if (!info.source.empty()) columns.emplace_back("source", info.source);
  return columns;
}

}  // namespace dropfront::report
