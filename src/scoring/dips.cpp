#include "dropfront/scoring/dips.hpp"

namespace dropfront::scoring {

namespace {

DipAnswer try_dip(const LeanRuns& runs, const RailLoad& load, const Dip& dip, DipSource source) {
  LeanEvent event;
  event.before = load;
  event.duration_s = dip.cycles * runs.heaviest.front()->values.mains.period_s();
  event.disturb = [dip, source](circuit::ElementValues& values) {
    values.mains = values.mains.scaled(dip.residual);
    if (source == DipSource::open_line) values.source_ohm = kOpenLine_ohm;
  };
  return {dip, source, worst_event(runs, event)};
}

}  // namespace

std::vector<DipAnswer> try_dips(const LeanRuns& runs, const LoadProfile& loads) {
  std::vector<DipAnswer> answers;
  const RailLoad load =
      rail_load(runs.stage(), loads.heaviest_output_A(),
                runs.points->design().reservoir->leakage_A + loads.heaviest_rail_A(), Quiescent::data);
  for (const Dip& dip : runs.points->requirement().limits.dips) {
    answers.push_back(try_dip(runs, load, dip, DipSource::generator));
    if (dip.residual <= 0) answers.push_back(try_dip(runs, load, dip, DipSource::open_line));
  }
  return answers;
}

}  // namespace dropfront::scoring
