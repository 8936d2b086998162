#pragma once
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "dropfront/parts/catalogue.hpp"
#include "dropfront/parts/columns.hpp"

namespace dropfront::report {

/// One value of a part under the column name of the parts lists: SI numbers (mm, degC and hours where the
/// column says so), true/false or text.
using parts::ColumnValue;
using Columns = std::vector<std::pair<std::string, ColumnValue>>;

/// Electrical columns only: what a score can depend on, name, source, sizes and prices apart. Ratings that
/// are not given are left out.
Columns electrical_columns(const parts::Dropper& part);
Columns electrical_columns(const parts::Resistor& part);
Columns electrical_columns(const parts::Clamp& part);
Columns electrical_columns(const parts::Reservoir& part);
Columns electrical_columns(const parts::Rectifier& part);
Columns electrical_columns(const parts::OutputStage& part);
Columns electrical_columns(const parts::Varistor& part);
Columns electrical_columns(const parts::Fuse& part);
Columns electrical_columns(const parts::Thyristor& part);
Columns electrical_columns(const parts::Ceramic& part);

/// length_mm, width_mm, height_mm, price_<quantity>, source: those that are given. Prices in the problem's
/// currency.
Columns common_columns(const parts::PartInfo& info);

/// Word of a design file for the kind of stage: direct, linear, step-down.
std::string_view kind_name(parts::StageKind kind);

}  // namespace dropfront::report
