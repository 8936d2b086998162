#include "dropfront/search/prospector.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace dropfront::search {
namespace {

constexpr double least_chance = 1e-4;
constexpr double least_spread = 0.02;
constexpr double cell = 0.2;    // of an axis
constexpr double nearby = 0.2;  // of an axis: how far a parent can serve as anchor

}  // namespace

Prospector::Prospector(SearchState& state, const std::vector<Parent>& parents)
    : state_(state), parents_(parents), checks_(state.telling_checks()) {}

void Prospector::fit(const std::vector<Offspring>& offspring) {
  const int m = state_.evaluator.objective_count();
  for (int k = 0; k < m; ++k)
    if (std::any_of(offspring.begin(), offspring.end(),
                    [k](const Offspring& design) { return std::isnan(design.known[k]); }))
      wanted_.push_back(k);
  for (int check : checks_) wanted_.push_back(m + check);
  place_of_.assign(m + state_.evaluator.check_names().size(), -1);
  for (std::size_t w = 0; w < wanted_.size(); ++w) place_of_[wanted_[w]] = static_cast<int>(w);
  if (!state_.options.switches.predict || wanted_.empty()) return;
  for (const Offspring& design : offspring) fits_[cell_of(design.choice)].clear();
  std::vector<std::pair<const Cell*, std::vector<LocalFit>*>> tasks;
  for (auto& entry : fits_) tasks.emplace_back(&entry.first, &entry.second);
  state_.workers.for_each(tasks.size(), 1, [&](std::size_t i) {
    std::vector<double> centre;
    for (int step : tasks[i].first->second) centre.push_back((step + 0.5) * cell);
    std::vector<LocalFit>& fits = *tasks[i].second;
    fits = state_.model.fit(tasks[i].first->first, centre, wanted_);
    if (std::all_of(fits.begin(), fits.end(), [](const LocalFit& f) { return f.usable(); })) return;
    const std::vector<LocalFit> others = state_.relaxed_model.fit(tasks[i].first->first, centre, wanted_);
    for (std::size_t w = 0; w < fits.size(); ++w)
      if (!fits[w].usable()) fits[w] = others[w];
  });
}

Prospector::Cell Prospector::cell_of(const Choice& choice) const {
  Cell result{state_.region_of(choice), {}};
  for (double x : state_.position_of(choice))
    result.second.push_back(std::min(static_cast<int>(x / cell), static_cast<int>(1 / cell) - 1));
  return result;
}

const LocalFit* Prospector::fit_of(const std::vector<LocalFit>* fits, int quantity) const {
  if (!fits || place_of_[quantity] < 0) return nullptr;
  const LocalFit& fit = (*fits)[place_of_[quantity]];
  return fit.usable() ? &fit : nullptr;
}

double Prospector::known(std::size_t parent, int quantity) const {
  const auto& quantities = parents_[parent].quantities;
  const std::size_t q = static_cast<std::size_t>(quantity);
  return q < quantities.size() ? quantities[q] : std::numeric_limits<double>::quiet_NaN();
}

// The fit's value, shifted to agree with what is known of a parent close by.
double Prospector::value(const LocalFit& fit, const Offspring& design, int quantity) const {
  const Choice& from = parents_[design.parent].choice;
  const std::vector<double> here = state_.position_of(design.choice);
  const double value = fit.value(here);
  const double anchor = known(design.parent, quantity);
  if (std::isnan(anchor) || state_.region_of(from) != state_.region_of(design.choice)) return value;
  const std::vector<double> there = state_.position_of(from);
  for (std::size_t a = 0; a < here.size(); ++a)
    if (std::abs(here[a] - there[a]) > nearby) return value;
  return value + anchor - fit.value(there);
}

std::vector<double> Prospector::objectives(const Offspring& design, const std::vector<LocalFit>* fits) const {
  std::vector<double> result = design.known;
  for (std::size_t k = 0; k < result.size(); ++k) {
    if (!std::isnan(result[k])) continue;
    const int quantity = static_cast<int>(k);
    const LocalFit* fit = fit_of(fits, quantity);
    result[k] = fit ? value(*fit, design, quantity) - fit->spread() : known(design.parent, quantity);
    // Nothing known at all: as good as it gets.
    if (std::isnan(result[k])) result[k] = -1e300;
  }
  return result;
}

double Prospector::chance(const Offspring& design, const std::vector<LocalFit>* fits) const {
  double product = state_.record.chance(parents_[design.parent].choice, design.choice);
  for (int check : checks_) {
    const int quantity = state_.evaluator.objective_count() + check;
    const LocalFit* fit = fit_of(fits, quantity);
    if (!fit) continue;
    // Logistic in place of the normal distribution; 1.7 matches their slopes.
    const double sigmas = value(*fit, design, quantity) / std::max(fit->spread(), least_spread);
    product *= 1 / (1 + std::exp(-1.7 * sigmas));
  }
  return std::max(product, least_chance);
}

std::vector<Guess> Prospector::guess(const std::vector<Offspring>& offspring) {
  fit(offspring);
  const FrontGauge gauge = state_.gauge();
  const double reach = state_.plan.reach;
  std::vector<Guess> guesses(offspring.size());
  state_.workers.for_each(offspring.size(), 16, [&](std::size_t i) {
    const Offspring& design = offspring[i];
    const auto found = fits_.find(cell_of(design.choice));
    const std::vector<LocalFit>* fits = found == fits_.end() ? nullptr : &found->second;
    Guess& guess = guesses[i];
    guess.objectives = objectives(design, fits);
    const double gain = gauge.gain(guess.objectives, -reach);
    guess.gain = gain > 0 ? std::min(gain, 1.0) / (1 + parents_[design.parent].violation) : gain;
    if (gain > -reach) guess.chance = chance(design, fits);
  });
  return guesses;
}

}  // namespace dropfront::search
