#pragma once
#include <vector>

#include "dropfront/scoring/lean_runs.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// What the line is while the voltage is gone.
enum class DipSource { generator, open_line };

/// Resistance of an open line: that of an open contact, and of the leak of a floating bridge. It takes a
/// microampere at the most from any supply here.
inline constexpr double kOpenLine_ohm = 1e9;

struct DipAnswer {
  Dip dip;
  DipSource source = DipSource::generator;
  EventAnswer worst;
};

/// The worst of the limits' dips (at least one), from the lean steady state at the heaviest sustained load:
/// the line's low end, which is harder than the rated voltage that IEC 61000-4-11 tests at; residual voltages
/// are shares of it. A generator keeps a zero-ohm source of the residual voltage, harmonics included; an
/// interruption (0 %) is tried with the line opened too. The mains phase runs on, and comes back at once.
DipAnswer try_dips(const LeanRuns& runs, const LoadProfile& loads);

}  // namespace dropfront::scoring
