#include "dropfront/report/part_columns.hpp"

namespace dropfront::report {

namespace {

/// Collects columns; an absent rating adds none.
class Collector {
 public:
  Collector& number(const char* name, double value) {
    columns_.emplace_back(name, ColumnValue(value));
    return *this;
  }
  Collector& rating(const char* name, const parts::Rating& value) {
    if (value) number(name, *value);
    return *this;
  }
  Collector& truth(const char* name, bool value) {
    columns_.emplace_back(name, ColumnValue(value));
    return *this;
  }
  Collector& text(const char* name, std::string value) {
    if (!value.empty()) columns_.emplace_back(name, ColumnValue(std::move(value)));
    return *this;
  }
  Columns take() { return std::move(columns_); }

 private:
  Columns columns_;
};

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

Columns electrical_columns(const parts::Dropper& p) {
  return Collector()
      .number("capacitance", p.capacitance_F)
      .number("tolerance", p.tolerance)
      .number("rated_voltage", p.rated_voltage_Vrms)
      .text("class", p.class_name)
      .truth("series_rated", p.series_rated)
      .rating("slew", p.slew_V_per_s)
      .rating("impulse", p.impulse_V)
      .number("loss_tangent", p.loss_tangent)
      .number("end_of_life_loss", p.end_of_life_loss)
      .number("temperature_coefficient", p.temperature_coefficient_per_K)
      .take();
}

Columns electrical_columns(const parts::Resistor& p) {
  return Collector()
      .number("resistance", p.resistance_ohm)
      .number("tolerance", p.tolerance)
      .rating("rated_power", p.rated_power_W)
      .rating("rated_voltage", p.rated_voltage_Vrms)
      .rating("overload_voltage", p.overload_voltage_V)
      .text("construction", p.construction == parts::Construction::wirewound ? "wirewound" : "film")
      .rating("pulse_energy", p.pulse_energy_J)
      .truth("fusible", p.fusible)
      .rating("opens_at", p.opens_at)
      .rating("thermal_resistance", p.thermal_resistance_K_per_W)
      .take();
}

Columns electrical_columns(const parts::Clamp& p) {
  return Collector()
      .number("voltage", p.voltage_V)
      .number("voltage_min", p.voltage_min_V)
      .number("voltage_max", p.voltage_max_V)
      .number("test_current", p.test_current_A)
      .number("slope_min", p.slope_min_ohm)
      .number("slope_resistance", p.slope_resistance_ohm)
      .rating("knee_current", p.knee_current_A)
      .rating("knee_resistance", p.knee_resistance_ohm)
      .rating("rated_power", p.rated_power_W)
      .rating("pulse_power", p.pulse_power_W)
      .rating("pulse_time", p.pulse_time_s)
      .number("temperature_coefficient", p.temperature_coefficient_per_K)
      .number("thermal_resistance", p.thermal_resistance_K_per_W)
      .number("max_junction", p.max_junction_degC)
      .take();
}

Columns electrical_columns(const parts::Reservoir& p) {
  return Collector()
      .number("capacitance", p.capacitance_F)
      .number("tolerance", p.tolerance)
      .number("rated_voltage", p.rated_voltage_V)
      .rating("surge_voltage", p.surge_voltage_V)
      .number("esr", p.esr_ohm)
      .number("esr_cold", p.esr_cold_ohm)
      .rating("ripple_current", p.ripple_current_Arms)
      .number("ripple_frequency", p.ripple_frequency_Hz)
      .number("leakage", p.leakage_A)
      .rating("life_hours", p.life_h)
      .rating("life_temperature", p.life_temperature_degC)
      .number("end_of_life_loss", p.end_of_life_loss)
      .number("end_of_life_esr", p.end_of_life_esr)
      .take();
}

Columns electrical_columns(const parts::Rectifier& p) {
  return Collector()
      .number("threshold_voltage", p.threshold_voltage_V)
      .number("slope_resistance", p.slope_resistance_ohm)
      .rating("reverse_voltage", p.reverse_voltage_V)
      .rating("surge_current", p.surge_current_A)
      .take();
}

Columns electrical_columns(const parts::OutputStage& p) {
  return Collector()
      .text("kind", std::string(kind_name(p.kind)))
      .number("output_voltage", p.output_voltage_V)
      .number("tolerance", p.tolerance)
      .number("dropout", p.dropout_V)
      .number("quiescent_current", p.quiescent_current_A)
      .number("quiescent_current_dropout", p.quiescent_current_dropout_A)
      .rating("input_max", p.input_max_V)
      .rating("input_min", p.input_min_V)
      .rating("input_on", p.input_on_V)
      .rating("input_off", p.input_off_V)
      .rating("efficiency", p.efficiency)
      .rating("thermal_resistance", p.thermal_resistance_K_per_W)
      .rating("max_junction", p.max_junction_degC)
      .take();
}

Columns electrical_columns(const parts::Varistor& p) {
  return Collector()
      .number("continuous_voltage", p.continuous_voltage_Vrms)
      .rating("clamp_voltage", p.clamp_voltage_V)
      .rating("clamp_current", p.clamp_current_A)
      .rating("energy", p.energy_J)
      .rating("surge_current", p.surge_current_A)
      .take();
}

Columns electrical_columns(const parts::Fuse& p) {
  return Collector()
      .number("rated_current", p.rated_current_A)
      .rating("melting_i2t", p.melting_i2t_A2s)
      .rating("rated_voltage", p.rated_voltage_Vrms)
      .take();
}

Columns electrical_columns(const parts::Thyristor& p) {
  return Collector()
      .number("on_voltage", p.on_voltage_V)
      .number("slope_resistance", p.slope_resistance_ohm)
      .rating("trigger_current", p.trigger_current_A)
      .rating("holding_current", p.holding_current_A)
      .rating("latching_current", p.latching_current_A)
      .rating("turn_off_time", p.turn_off_time_s)
      .rating("surge_current", p.surge_current_A)
      .take();
}

Columns electrical_columns(const parts::Ceramic& p) {
  return Collector()
      .number("capacitance", p.capacitance_F)
      .number("tolerance", p.tolerance)
      .rating("rated_voltage", p.rated_voltage_V)
      .take();
}

Columns common_columns(const parts::PartInfo& info) {
  Collector columns;
  const auto size = [&](const char* name, const std::optional<std::int64_t>& um) {
    if (um) columns.number(name, static_cast<double>(*um) / 1000);
  };
  size("length_mm", info.length_um);
  size("width_mm", info.width_um);
  size("height_mm", info.height_um);
  for (const auto& step : info.price_breaks)
    columns.number(("price_" + std::to_string(step.quantity)).c_str(),
                   static_cast<double>(step.price_micro) / 1e6);
  columns.text("source", info.source);
  return columns.take();
}

}  // namespace dropfront::report
