#include "dropfront/search/prospect.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <utility>

#include "dropfront/search/front_gauge.hpp"

namespace dropfront::search {
namespace {

using FitKey = std::pair<std::size_t, std::int64_t>;  // parent, region

// One fit for each parent and region that occurs, made in parallel, kept in key order.
std::map<FitKey, LocalFit> fits_for(Session& session, const std::vector<Parent>& parents,
                                    const std::vector<Looked>& looked,
                                    const std::vector<std::size_t>& made_from) {
  std::map<FitKey, LocalFit> fits;
  if (!session.options.switches.predict) return fits;
  for (const Looked& design : looked) {
    const bool unknown = std::any_of(design.objectives.begin(), design.objectives.end(),
                                     [](double x) { return std::isnan(x); });
    if (unknown) fits[{made_from[design.origin], session.region_of(design.choice)}];
  }
  std::vector<std::pair<FitKey, LocalFit*>> tasks;
  for (auto& entry : fits) tasks.emplace_back(entry.first, &entry.second);
  session.workers.for_each(tasks.size(), 1, [&](std::size_t i) {
    const auto position = session.position_of(parents[tasks[i].first.first].choice);
    *tasks[i].second = session.model.fit(tasks[i].first.second, position);
  });
  return fits;
}

std::vector<double> predict(const Session& session, const Parent& parent, const Looked& design,
                            const LocalFit* fit) {
  std::vector<double> predicted = design.objectives;
  const bool same_region = session.region_of(parent.choice) == session.region_of(design.choice);
  for (std::size_t k = 0; k < predicted.size(); ++k) {
    if (!std::isnan(predicted[k])) continue;
    const int at = static_cast<int>(k);
    predicted[k] = parent.objectives[k];
    if (!fit || !fit->usable()) continue;
    double spread = 0;
    const double there = fit->value(at, session.position_of(design.choice), &spread);
    const bool anchored = same_region && !std::isnan(parent.objectives[k]);
    const double shift =
        anchored ? parent.objectives[k] - fit->value(at, session.position_of(parent.choice)) : 0;
    predicted[k] = there + shift - spread;
  }
  return predicted;
}

}  // namespace

void prospect(Session& session, CandidateQueue& queue, const std::vector<Parent>& parents,
              const std::vector<Choice>& choices, const std::vector<std::size_t>& made_from) {
  const std::vector<Looked> looked = session.look_new(choices);
  const auto fits = fits_for(session, parents, looked, made_from);
  const FrontGauge gauge(session.ledger.front());
  std::vector<std::vector<double>> predictions(looked.size());
  std::vector<double> gains(looked.size());
  session.workers.for_each(looked.size(), 16, [&](std::size_t i) {
    const Looked& design = looked[i];
    const std::size_t p = made_from[design.origin];
    const auto fit = fits.find({p, session.region_of(design.choice)});
    predictions[i] = predict(session, parents[p], design, fit == fits.end() ? nullptr : &fit->second);
    // Nothing known at all of an objective: as good as it gets.
    for (double& x : predictions[i])
      if (std::isnan(x)) x = -1e300;
    const double gain = gauge.gain(predictions[i], -session.plan.reach);
    gains[i] = gain > 0 ? std::min(gain, 1.0) / (1 + parents[p].violation) : gain;
  });
  for (std::size_t i = 0; i < looked.size(); ++i) {
    const Choice& parent = parents[made_from[looked[i].origin]].choice;
    if (gains[i] <= -session.plan.reach) {
      queue.leave_out();
      continue;
    }
    const double chance = session.record.chance(parent, looked[i].choice);
    queue.push(looked[i].choice, looked[i].objectives, predictions[i], chance, gains[i]);
  }
}

}  // namespace dropfront::search
