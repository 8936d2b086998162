#include "dropfront/scoring/surge.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "dropfront/circuit/surge_wave.hpp"

namespace dropfront::scoring {

namespace {

/// Plans and runs the cases of one design on one supply.
class Surges {
 public:
  Surges(const PointSolver& points, const Recipe& rich, const std::vector<const OperatingPoint*>& rest,
         const Surge& surge, int& transients)
      : points_(points), rest_(rest), surge_(surge), transients_(transients), recipe_(rich) {
    low_ohm_ = series_resistor_ohm(points.design(), End::low);
    high_ohm_ = series_resistor_ohm(points.design(), End::high);
  }

  SurgeAnswer run() {
    if (!at_rest()) return std::move(answer_);
    first_round();
    if (!failed_) find_rail();
    if (!failed_) find_clamp();
    if (!failed_) find_resistor();
    if (!failed_ && points_.design().arrangement->dropper) find_dropper();
    if (!failed_ && points_.design().varistor != nullptr) find_varistor();
    answer_.usable = !failed_;
    return std::move(answer_);
  }

 private:
  struct Place {
    std::size_t moment = 0;
    double sign = 1;
  };

  bool at_rest();
  SurgeRun at(std::size_t rest, const Place& place, const SurgeCase& which, const std::string& ends);
  SurgeCase ordinary(ZenerCurve curve, double series_ohm) const;
  double clamp_use(const SurgeRun& run) const;
  double resistor_use(const SurgeRun& run) const;
  void first_round();
  void find_rail();
  void find_clamp();
  void find_resistor();
  void find_dropper();
  void find_varistor();
  void take(const SurgeRun& run);

  const PointSolver& points_;
  const std::vector<const OperatingPoint*>& rest_;
  const Surge& surge_;
  int& transients_;
  Recipe recipe_;
  double low_ohm_ = 0, high_ohm_ = 0;
  std::vector<std::vector<SurgeMoment>> moments_;  ///< one list an ambient
  std::size_t cold_ = 0;
  Place rail_, resistor_, dropper_, varistor_;
  std::vector<std::pair<double, Place>> by_clamp_;
  bool failed_ = false;
  SurgeAnswer answer_;
};

bool Surges::at_rest() {
  if (rest_.empty()) return false;
  cold_ = rest_.size() - 1;
  for (const auto* rest : rest_) {
    if (!rest->state.usable()) {
      answer_.reason = rest->state.reason;
      return false;
    }
    const auto network = points_.design().arrangement->build(rest->values);
    const bool mirrored = !network.half_period_signs.empty();
    const std::vector<double> phases =
        mirrored ? std::vector<double>{0, 90} : std::vector<double>{0, 90, 180, 270};
    moments_.push_back(surge_moments(points_, *rest, phases));
    ++transients_;
    if (moments_.back().empty()) {
      answer_.reason = "the supply could not be followed to the surge's phase";
      return false;
    }
  }
  return true;
}

SurgeCase Surges::ordinary(ZenerCurve curve, double series_ohm) const {
  SurgeCase which;
  which.recipe = recipe_;
  which.recipe.clamp = curve;
  which.series_resistor_ohm = series_ohm;
  which.surge_V = surge_.voltage_V;
  which.source_ohm = surge_.source_ohm;
  return which;
}

SurgeRun Surges::at(std::size_t rest, const Place& place, const SurgeCase& which, const std::string& ends) {
  SurgeCase signed_case = which;
  signed_case.surge_V *= place.sign;
  auto run = run_surge(points_, *rest_[rest], moments_[rest][place.moment], signed_case);
  ++transients_;
  run.ends = ends;
  if (!run.usable) {
    failed_ = true;
    answer_.reason = run.reason;
  }
  return run;
}

double Surges::clamp_use(const SurgeRun& run) const {
  const double room_K = points_.design().clamp->max_junction_degC - std::max(25.0, run.clamp_junction_degC);
  return room_K > 0 ? run.clamp_stress_W_sqrt_s / room_K : std::numeric_limits<double>::max();
}

/// What the part's rating is used up by: joules, or for a film energy x peak power (P·√t of the rectangle
/// with the same energy and peak).
double Surges::resistor_use(const SurgeRun& run) const {
  const double energy_J = run.resistor.energy_J;
  if (points_.design().series_resistor->construction == parts::Construction::wirewound) return energy_J;
  return energy_J * run.resistor.peak_A * run.resistor.peak_A * run.values.series_resistor_ohm;
}

/// Figures that any run may hold the greatest of.
void Surges::take(const SurgeRun& run) {
  const auto keep = [&run](SurgeRun& best, double SurgeRun::*figure) {
    if (!best.usable || run.*figure > best.*figure) best = run;
  };
  keep(answer_.line, &SurgeRun::line_A2s);
  keep(answer_.rectifier, &SurgeRun::rectifier_peak_A);
  keep(answer_.thyristor, &SurgeRun::thyristor_peak_A);
  keep(answer_.dropper, &SurgeRun::dropper_peak_V);
  keep(answer_.varistor, &SurgeRun::varistor_energy_J);
  keep(answer_.varistor_peak, &SurgeRun::varistor_peak_A);
}

/// Every phase and polarity with the high curve, cold, where the ESR is greatest: the rail, and where
/// everything else is worst.
void Surges::first_round() {
  const auto which = ordinary(ZenerCurve::high, low_ohm_);
  double best_resistor = -1, best_dropper_V = -1, best_varistor_J = -1, best_rail_V = -1;
  for (std::size_t m = 0; m < moments_.front().size(); ++m) {
    for (const double sign : {1.0, -1.0}) {
      const Place place{m, sign};
      const auto run = at(cold_, place, which, "series_resistor low, clamp high");
      if (failed_) return;
      take(run);
      const auto better = [&place](double value, double& best, Place& where) {
        if (!(value > best)) return false;
        best = value;
        where = place;
        return true;
      };
      if (better(run.rail_max_V, best_rail_V, rail_)) answer_.rail = run;
      better(resistor_use(run), best_resistor, resistor_);
      better(run.dropper_peak_V, best_dropper_V, dropper_);
      better(run.varistor_energy_J, best_varistor_J, varistor_);
      by_clamp_.emplace_back(run.clamp_energy_J * run.clamp_peak_A, place);
    }
  }
}

/// The rail's worst place hot.
void Surges::find_rail() {
  if (rest_.size() < 2) return;
  auto which = ordinary(ZenerCurve::high, low_ohm_);
  which.rail_only = true;
  const auto run = at(0, rail_, which, "series_resistor low, clamp high");
  if (!failed_ && run.rail_max_V > answer_.rail.rail_max_V) answer_.rail = run;
}

/// The clamp at its stiffest, hot, at the places where energy and peak current promise within a seventh of
/// the most; the worst of them cold.
void Surges::find_clamp() {
  std::stable_sort(by_clamp_.begin(), by_clamp_.end(),
                   [](const auto& a, const auto& b) { return a.first > b.first; });
  auto which = ordinary(ZenerCurve::low_slope, low_ohm_);
  which.stress = true;
  const auto judge = [&](std::size_t rest, const Place& place) {
    const auto run = at(rest, place, which, "series_resistor low");
    if (failed_) return false;
    take(run);
    if (answer_.clamp.usable && !(clamp_use(run) > clamp_use(answer_.clamp))) return false;
    answer_.clamp = run;
    return true;
  };
  constexpr double kNearMost = 6.0 / 7;
  Place worst;
  for (const auto& [promise, place] : by_clamp_) {
    if (failed_ || !(promise >= kNearMost * by_clamp_.front().first)) break;
    if (judge(0, place)) worst = place;
  }
  if (!failed_ && rest_.size() > 1) judge(cold_, worst);
}

void Surges::find_resistor() {
  const auto judge = [&](double series_ohm, const char* ends) {
    const auto run = at(cold_, resistor_, ordinary(ZenerCurve::low_slope, series_ohm), ends);
    if (failed_) return;
    take(run);
    answer_.resistors.push_back(run);
  };
  judge(low_ohm_, "series_resistor low");
  if (failed_) return;
  const auto& values = answer_.resistors.front().values;
  const double between_ohm =
      greatest_energy_ohm(surge_.source_ohm + values.rectifier.slope_ohm, values.dropper_F);
  if (between_ohm > low_ohm_ && between_ohm < high_ohm_)
    judge(between_ohm, "series_resistor between its ends");
  if (!failed_) judge(high_ohm_, "series_resistor high");
}

void Surges::find_dropper() {
  auto which = ordinary(ZenerCurve::low_slope, low_ohm_);
  which.recipe.dropper = End::low;
  const auto run = at(0, dropper_, which, "dropper low, series_resistor low");
  if (!failed_) take(run);
}

/// In front of the series resistor it takes most when little goes past it; behind, when much comes to it.
void Surges::find_varistor() {
  const bool before = points_.design().varistor_before;
  auto which = ordinary(ZenerCurve::low_slope, before ? high_ohm_ : low_ohm_);
  which.recipe.dropper = End::low;
  const std::string ends = before ? "dropper low, series_resistor high" : "dropper low, series_resistor low";
  for (const auto end : {VaristorEnd::low, VaristorEnd::high}) {
    which.varistor = end;
    const auto run =
        at(0, varistor_, which, ends + (end == VaristorEnd::low ? ", varistor low" : ", varistor high"));
    if (failed_) return;
    take(run);
  }
}

}  // namespace

double greatest_energy_ohm(double other_ohm, double capacitance_F) {
  return std::sqrt(other_ohm * other_ohm + other_ohm * circuit::SurgeWave::kTail_s / capacitance_F);
}

SurgeAnswer run_surges(const PointSolver& points, const Recipe& rich,
                       const std::vector<const OperatingPoint*>& rest, const Surge& surge, int& transients) {
  return Surges(points, rich, rest, surge, transients).run();
}

}  // namespace dropfront::scoring
