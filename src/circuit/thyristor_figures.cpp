#include "dropfront/circuit/thyristor_figures.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/extremes.hpp"

namespace dropfront::circuit {

namespace {

/// Follows one thyristor's voltage after it has dropped out: it stays slightly positive for a moment, rests
/// at or below its on-voltage, and is positive again. The rest is what it has to recover in.
class Recovery {
 public:
  void drop_out() {
    stage_ = Stage::dropping;
    rest_s_ = 0;
  }
  void sample(double voltage_V, double on_V, double step_s) {
    if (stage_ == Stage::ready) return;
    if (voltage_V <= on_V) {
      stage_ = Stage::resting;
      rest_s_ += step_s;
    } else if (stage_ == Stage::resting) {
      shortest_s_ = std::min(shortest_s_, rest_s_);
      stage_ = Stage::ready;
    }
  }
  /// It fired again before it came to rest.
  void fired() {
    if (stage_ != Stage::ready) shortest_s_ = std::min(shortest_s_, rest_s_);
    stage_ = Stage::ready;
  }
  double shortest_s() const { return shortest_s_; }

 private:
  enum class Stage { ready, dropping, resting } stage_ = Stage::ready;
  double rest_s_ = 0;
  double shortest_s_ = INFINITY;
};

constexpr int kSamples = 256;  // a segment: the rest is known to this share of its segments

}  // namespace

ThyristorFigures thyristor_figures(const Walker& walker, const std::vector<Segment>& segments,
                                   const WalkTotals& totals) {
  ThyristorFigures figures;
  const auto& network = walker.network();
  const auto& mains = network.source.waveform;
  const std::size_t first = network.branches.size() + network.loads.size();
  TonePhase phase(mains);
  for (std::size_t t = 0; t < network.thyristors.size(); ++t) {
    const auto& part = network.thyristors[t];
    const std::size_t element = network.resistors.size() + first + t;
    const auto latched = [&](const Segment& segment) { return (segment.mode->mask >> (first + t)) & 1u; };
    double peak_A = 0;
    Recovery recovery;
    // Round twice: the rest may run over the end of the period.
    for (std::size_t k = 0; k < 2 * segments.size(); ++k) {
      const Segment& segment = segments[k % segments.size()];
      const Segment& before = segments[(k + segments.size() - 1) % segments.size()];
      const ModalRow& row = segment.mode->element_V[element];
      const ForcedRow forced = forced_part(*segment.mode, mains, row);
      if (latched(segment)) {
        if (!latched(before)) recovery.fired();
        Extremes over;
        include_extremes(segment, row, forced, phase, over);
        peak_A = std::max(peak_A, (over.high - part.on_voltage_V) / part.slope_ohm);
        continue;
      }
      if (latched(before)) recovery.drop_out();
      for (int i = 1; i <= kSamples; ++i) {
        const double s = segment.length_s * i / kSamples;
        phase.set(segment.start_s + s);
        recovery.sample(value_at(row, forced, modal_moment(segment, s), phase), part.on_voltage_V,
                        segment.length_s / kSamples);
      }
    }
    figures.peak_A.push_back(peak_A);
    figures.mean_A.push_back(totals.duration_s > 0 ? totals.element_As[element] / totals.duration_s : 0);
    figures.turn_off_s.push_back(recovery.shortest_s());
  }
  return figures;
}

}  // namespace dropfront::circuit
