#include <algorithm>
#include <array>
#include <cmath>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"

namespace dropfront::scoring {

namespace {

/// Share of the melting I²t a fuse may carry in each of so many pulses: 48 % for a hundred, 38 % for a
/// thousand, 29 % for ten thousand, 22 % for a hundred thousand, straight in the logarithm of their number
/// (common practice, from memory).
double pulse_share(double pulses) {
  constexpr std::array<double, 4> kShares{0.48, 0.38, 0.29, 0.22};
  const double place = std::clamp(std::log10(std::max(pulses, 1.0)) - 2, 0.0, 3.0);
  const auto step = std::min<std::size_t>(2, static_cast<std::size_t>(place));
  return kShares[step] + (place - static_cast<double>(step)) * (kShares[step + 1] - kShares[step]);
}

/// Steady current a fuse may carry: three quarters of its rating (common practice).
constexpr double kSteadyShare = 0.75;
/// Surges in a test: five of each polarity at four phases, and as many in service.
constexpr double kSurges = 100;

}  // namespace

/// The fuse must live through running, plug-ins and surges: the greatest of three shares of what it may
/// carry.
std::optional<Check> fuse_hold(Evidence& evidence) {
  const Design& design = evidence.design();
  if (design.fuse == nullptr) return std::nullopt;
  const parts::Fuse& fuse = *design.fuse;
  const bool surges = evidence.requirement().limits.surge.has_value();
  std::optional<Check> worst;
  const auto judge = [&](double share, At at, const char* basis, std::vector<Term> figures) {
    Check check = with(at_most("fuse.hold", share, 1.0, "", std::move(at), basis), std::move(figures));
    worst = worst ? worse(*worst, check) : check;
  };
  for (const OperatingPoint* point : rich_points(evidence)) {
    if (!point->state.usable()) {
      return unsolved(at_most("fuse.hold", std::nullopt, 1.0, "", at_point(*point), ""), point->state.reason);
    }
    const double line_Arms = point->state.input_current_Arms;
    judge(line_Arms / (kSteadyShare * fuse.rated_current_A), at_point(*point),
          "running current against three quarters of the rated current (common practice)",
          {{"line_current_Arms", line_Arms},
           {"rated_current_A", fuse.rated_current_A},
           {"allowed_share", kSteadyShare}});
  }
  if (!fuse.melting_i2t_A2s) {
    if (worst->pass == false) return worst;
    return at_most("fuse.hold", std::nullopt, std::nullopt, "", at_corner("plug_in"),
                   "melting_i2t is not given");
  }
  const PlugInAnswer& plug_in = evidence.plug_in();
  if (!plug_in.usable) {
    return unsolved(at_most("fuse.hold", std::nullopt, 1.0, "", at_corner("plug_in"), ""), plug_in.reason);
  }
  const auto pulse = [&](double squared_A2s, double pulses, At at, const char* basis) {
    const double share = pulse_share(pulses);
    judge(squared_A2s / (share * *fuse.melting_i2t_A2s), std::move(at), basis,
          {{"pulse_A2s", squared_A2s}, {"melting_A2s", *fuse.melting_i2t_A2s}, {"allowed_share", share}});
  };
  const double plugged_A2s = plug_in.resistor_energy_low_J / plug_in.resistor_low.values.series_resistor_ohm;
  if (design.dropper != nullptr) {
    pulse(plugged_A2s, evidence.requirement().connection.plug_ins, at_plug_in(plug_in.resistor_low),
          "plug-in I²t against the share of the melting I²t for that many pulses (common practice, from "
          "memory)");
  }
  if (surges) {
    const SurgeAnswer& surge = evidence.surge();
    if (!surge.usable) {
      return unsolved(at_most("fuse.hold", std::nullopt, 1.0, "", at_corner("surge"), ""), surge.reason);
    }
    pulse(
        surge.line.line_A2s, kSurges, at_surge(surge.line),
        "surge I²t against the share of the melting I²t for a hundred pulses (common practice, from memory)");
  }
  return worst;
}

}  // namespace dropfront::scoring
