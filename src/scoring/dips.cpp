#include "dropfront/scoring/dips.hpp"

namespace dropfront::scoring {

namespace {

LeanEvent dip_event(const RailLoad& load, const Dip& dip, DipSource source, double period_s) {
  LeanEvent event;
  event.before = load;
  event.duration_s = dip.cycles * period_s;
  event.disturb = [dip, source](circuit::ElementValues& values) {
    values.mains = values.mains.scaled(dip.residual);
    if (source == DipSource::open_line) values.source_ohm = kOpenLine_ohm;
  };
  return event;
}

}  // namespace

DipAnswer try_dips(const LeanRuns& runs, const LoadProfile& loads) {
  DipAnswer answer;
  answer.worst.reason = runs.fault();
  if (!answer.worst.reason.empty()) return answer;
  const RailLoad load =
      rail_load(runs.stage(), loads.heaviest_output_A(),
                runs.points->design().reservoir->leakage_A + loads.heaviest_rail_A(), Quiescent::data);
  const double period_s = runs.heaviest.front()->values.mains.period_s();
  std::vector<LeanEvent> events;
  std::vector<DipAnswer> tried;
  for (const Dip& dip : runs.points->requirement().limits.dips) {
    for (const auto source : {DipSource::generator, DipSource::open_line}) {
      if (source == DipSource::open_line && dip.residual > 0) continue;
      events.push_back(dip_event(load, dip, source, period_s));
      tried.push_back({dip, source, {}});
    }
  }
  const EventAnswer worst = worst_event(runs, events);
  answer = tried.at(worst.event);
  answer.worst = worst;
  return answer;
}

}  // namespace dropfront::scoring
