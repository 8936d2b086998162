#include "dropfront/scoring/corner_figures.hpp"

#include <cmath>

namespace dropfront::scoring {

std::vector<Term> corner_figures(const circuit::ElementValues& values, double local_degC,
                                 double clamp_junction_degC) {
  std::vector<Term> figures;
  figures.reserve(20);
  figures.push_back({"line_voltage_Vrms", values.mains.voltage_Vrms()});
  figures.push_back({"line_frequency_Hz", values.mains.frequency_Hz()});
  figures.push_back({"line_crest_V", values.mains.crest_V()});
  figures.push_back({"series_resistor_ohm", values.series_resistor_ohm});
  figures.push_back({"dropper_F", values.dropper_F});
  figures.push_back({"dropper_esr_ohm", values.dropper_esr_ohm});
  if (std::isfinite(values.discharge_ohm)) figures.push_back({"discharge_chain_ohm", values.discharge_ohm});
  figures.push_back({"rectifier_threshold_V", values.rectifier.threshold_V});
  figures.push_back({"rectifier_slope_ohm", values.rectifier.slope_ohm});
  figures.push_back({"clamp_threshold_V", values.clamp.main.threshold_V});
  figures.push_back({"clamp_slope_ohm", values.clamp.main.slope_ohm});
  if (values.clamp.knee) {
    figures.push_back({"clamp_knee_threshold_V", values.clamp.knee->threshold_V});
    figures.push_back({"clamp_knee_slope_ohm", values.clamp.knee->slope_ohm});
  }
  figures.push_back({"reservoir_F", values.reservoir_F});
  figures.push_back({"reservoir_esr_ohm", values.reservoir_esr_ohm});
  figures.push_back({"rail_current_A", values.rail_current_A});
  figures.push_back({"local_degC", local_degC});
  figures.push_back({"clamp_junction_degC", clamp_junction_degC});
  return figures;
}

}  // namespace dropfront::scoring
