#pragma once
#include "dropfront/circuit/element_values.hpp"
#include "dropfront/scoring/corners/electrolytic.hpp"
#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/scoring/corners/zener_curve.hpp"
#include "dropfront/scoring/design.hpp"

namespace dropfront::scoring {

enum class End { low, nominal, high };
enum class Drops { least, nominal, greatest };

/// Which end of everything one corner takes. The free ends (Rs, ESR, Rb) are set by whoever searches them.
struct Recipe {
  const circuit::Waveform* mains = nullptr;
  End dropper = End::nominal;  ///< low includes ageing when `aged`
  End series_resistor = End::nominal;
  End discharge = End::nominal;
  ZenerCurve clamp = ZenerCurve::nominal;
  End reservoir = End::nominal;  ///< capacitance
  End esr = End::nominal;
  Drops drops = Drops::nominal;
  /// Age in lives: 0 new, 1 end of life. Loss of dropper and reservoir and the rise of the ESR are straight
  /// in time, beyond the life too.
  double aged = 0;
};

/// Where the parts are: air around them, and the clamp's own junction.
struct Temperatures {
  double local_degC = 25;
  double clamp_junction_degC = 25;
};

/// Values of `design` by `recipe`: film, drops and electrolytics at the air around them, the clamp at its own
/// junction, in every corner. rail_current_A is left 0. The design's mandatory parts must be present.
circuit::ElementValues corner_values(const Design& design, const Recipe& recipe, const Temperatures& at,
                                     double load_cutoff_V);

/// resistance·(1 ± tolerance).
double resistor_ohm(const parts::Resistor& part, End end);
/// The whole series resistor: its parts in series.
double series_resistor_ohm(const Design& design, End end);
/// Greatest share of the series resistor's voltage, or of a pulse's energy, that one of its parts takes.
double series_resistor_share(const Design& design);
/// All droppers in parallel, as dropper_F.
double all_droppers_F(const Design& design, End end, double aged, double local_degC);
/// The whole chain; infinite when there is none.
double discharge_ohm(const Design& design, End end);
/// One film capacitor: tolerance end, loss with age (low end only), temperature law about 20 degC. `aged` is
/// the age in lives, as in Recipe.
double dropper_F(const parts::Dropper& part, End end, double aged, double local_degC);
/// Equivalent series resistance tan(delta)/(omega·C).
double dropper_esr_ohm(const parts::Dropper& part, double capacitance_F, double frequency_Hz);
/// Threshold spans -0.3 V (least: no current, hot) to +2 mV/K below 25 degC (greatest).
circuit::Curve rectifier_curve(const parts::Rectifier& part, Drops drops, double local_degC);

}  // namespace dropfront::scoring
