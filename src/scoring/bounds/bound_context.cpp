#include "dropfront/scoring/bounds/bound_context.hpp"

#include "dropfront/scoring/board_area.hpp"

namespace dropfront::scoring {

Line::Line(const circuit::Waveform& waveform)
    : frequency_Hz(waveform.frequency_Hz()),
      omega(waveform.omega()),
      voltage_Vrms(waveform.voltage_Vrms()),
      crest_V(waveform.crest_V()),
      rises_V(waveform.sum_of_rises_V()),
      symmetric(waveform.odd_only()) {
  for (const auto& tone : waveform.tones()) {
    const double k = tone.order;
    slope_V_per_s += k * omega * tone.amplitude_V;
    bend_V_per_s2 += k * omega * k * omega * tone.amplitude_V;
    if (tone.order == 1) {
      fundamental_V = tone.amplitude_V;
    } else {
      chain_tones_V += 2 * k * tone.amplitude_V * (k + 1 / k);
      // Over half a period tone k adds 2·A_k/(k·w)·cos at the crest, and the cosines there sum to no slope:
      // the fundamental's is at most the sum of k·A_k of the others.
      crest_area_Vs += 2 / omega * tone.amplitude_V * (k + 1 / k);
    }
  }
}

SupplyLines::SupplyLines(const Supply& of, const MainsShapes& made)
    : supply(&of), shapes(made), lean(made.lean), rich(made.rich), standby(made.nominal) {}

BoundContext::BoundContext(const Requirement& of)
    : requirement(&of), loads(load_profile(of.output)), mains_margin_um(scoring::mains_margin_um(of)) {
  supplies.reserve(of.supplies.size());
  for (const auto& supply : of.supplies) supplies.emplace_back(supply, mains_shapes(supply));
}

}  // namespace dropfront::scoring
