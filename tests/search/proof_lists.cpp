#include "search/proof_lists.hpp"

namespace toy {
namespace {

constexpr double nan_value = std::numeric_limits<double>::quiet_NaN();
constexpr double infinity = std::numeric_limits<double>::infinity();
enum SlotAt { arrangement, stage, dropper, resistor, clamp, reservoir, maker };
enum CheckAt { resistor_power, clamp_power, reservoir_voltage, rail_min, rail_max, margin, dropper_voltage };
constexpr int checks = 7;
// Reservoirs of a higher rating have a loss that is not a number.
constexpr double not_computable = 3;
// Checks that a look makes.
constexpr int list_checks[] = {reservoir_voltage, rail_min, rail_max};

/// The slot whose rating limits a check; -1: a limit of the problem.
int rated_slot(int check) {
  const int slots[] = {resistor, clamp, reservoir, -1, -1, -1, dropper};
  return slots[check];
}

double constant(double x, double) { return x; }
Interval constant(double x, Interval) { return {x, x}; }

}  // namespace

ProofLists::ProofLists(const ProofShape& shape, Fault fault) : shape_(shape), fault_(fault) {
  Random random{shape.seed * 7919 + 3};
  const char* names[] = {"arrangement", "stage", "dropper", "resistor", "clamp", "reservoir", "maker"};
  const double least[] = {1, 3, 0.2, 20, 5, 20, 1}, most[] = {2, 8, 3.0, 400, 40, 1000, 1};
  for (int s = 0; s < 7; ++s) {
    Slot slot;
    slot.name = names[s];
    slot.size = shape.sizes[s];
    slot.category = s <= stage;
    std::vector<BoxPart> parts;
    for (int i = 0; i < slot.size; ++i) {
      BoxPart part;
      // Values come in an order of their own, twice or so each.
      const int step = static_cast<int>(random.uniform() * std::max(1, (slot.size + 1) / 2));
      const double u = step / std::max(1.0, (slot.size + 1) / 2 - 1.0);
      part.value = s == arrangement ? 1 + i : least[s] * std::pow(most[s] / least[s], u);
      part.loss = s == resistor && random.uniform() < 0.3 ? 1.1 : 1;
      part.price = 3 + static_cast<int>(random.between(0, 16));
      part.area = 2 + static_cast<int>(random.between(0, 15));
      part.rating = random.uniform() < 0.06 ? nan_value : random.between(0.7, not_computable + 0.2);
      if (i > 0 && random.uniform() < 0.25) part = parts[static_cast<int>(random.uniform() * i)];
      parts.push_back(part);
      if (!slot.category && s != maker && slot.size > 1) slot.coordinate.push_back(std::log(part.value));
      if (s == stage) slot.group.push_back(i % 2);
    }
    space_.slots.push_back(slot);
    parts_.push_back(parts);
  }
  space_.coupled = {{dropper, resistor}, {clamp, reservoir}};
  resolution_ = {shape.resolution * 100, shape.resolution, shape.resolution * 100, shape.resolution};
  resolution_.resize(shape.objectives);
}

template <class T>
ProofLists::Figures<T> ProofLists::figures(const Values<T>& v, double way) const {
  const auto k = [&](double x) { return constant(x, v.value[dropper]); };
  Figures<T> f;
  f.cost = v.price[0];
  f.area = v.area[0];
  for (int s = 1; s < 7; ++s) f.cost = f.cost + v.price[s], f.area = f.area + v.area[s];
  const T c = v.value[dropper], r = v.value[resistor], z = v.value[clamp];
  const T current = k(way) * c / (k(1) + k(0.0015) * r * c) * (k(1) - z / k(120));
  const T ripple = k(8) * current / root(v.value[reservoir]);
  f.margin = current - k(0.15) * ripple - k(1) / z - k(0.02) * v.value[stage];
  f.loss = k(0.15) * current * z / k(12) + k(0.0012) * r * current * current * v.loss[resistor] +
           k(0.02) * v.loss[reservoir];
  // A hump: greatest somewhere inside the range of the resistor.
  f.stress = {k(0.5) * r / (k(60) + r * r / k(200)) + k(0.2) * c,
              c * z / k(20),
              z / k(25),
              z,
              z,
              k(0) - f.margin,
              k(0.7) + k(30) / r};
  return f;
}

std::vector<double> ProofLists::objectives(const Figures<double>& f) const {
  std::vector<double> all{f.cost, f.loss, f.area, -f.margin};
  all.resize(shape_.objectives);
  return all;
}

ProofLists::Values<double> ProofLists::values_of(const Choice& c) const {
  Values<double> v;
  for (int s = 0; s < 7; ++s) {
    const BoxPart& part = parts_[s][c[s]];
    v.value[s] = part.value, v.loss[s] = part.loss;
    v.price[s] = part.price, v.area[s] = part.area;
  }
  // Some reservoirs cannot be computed.
  const BoxPart& part = parts_[reservoir][c[reservoir]];
  if (part.rating > not_computable) v.loss[reservoir] = nan_value;
  return v;
}

ProofLists::Values<Interval> ProofLists::values_of(const Box& box) const {
  Values<Interval> v;
  for (int s = 0; s < 7; ++s) {
    v.value[s] = v.loss[s] = v.price[s] = v.area[s] = Interval{infinity, -infinity};
    const auto widen = [](Interval& i, double x) { i = {std::min(i.low, x), std::max(i.high, x)}; };
    for (const auto option : box.options[s]) {
      const BoxPart& part = parts_[s][option];
      widen(v.value[s], part.value), widen(v.loss[s], part.loss);
      widen(v.price[s], part.price), widen(v.area[s], part.area);
    }
  }
  return v;
}

double ProofLists::allowed(int check, const Choice& c) const {
  const int slot = rated_slot(check);
  if (slot >= 0) return parts_[slot][c[slot]].rating;
  // The window of the rail moves with the stage.
  if (check == rail_min) return parts_[stage][c[stage]].value + 1;
  if (check == rail_max) return parts_[stage][c[stage]].value * 5;
  return -shape_.least_margin;
}

Interval ProofLists::allowed(int check, const Box& box, bool& all_given) const {
  Interval range{infinity, -infinity};
  Choice c(7, 0);
  const int slot = rated_slot(check) >= 0 ? rated_slot(check) : static_cast<int>(stage);
  for (const auto option : box.options[slot]) {
    c[slot] = option;
    const double one = allowed(check, c);
    if (std::isnan(one)) all_given = false;
    if (!std::isnan(one)) range = {std::min(range.low, one), std::max(range.high, one)};
  }
  return range;
}

Evaluation ProofLists::look(const Choice& c) const {
  const Figures<double> f = figures(values_of(c), parts_[0][c[0]].value);
  Evaluation e;
  e.outcome = Outcome::compliant;
  e.objectives = objectives(f);
  for (std::size_t k = 1; k < e.objectives.size(); k += 2) e.objectives[k] = nan_value;
  for (const int check : list_checks) {
    const double most = allowed(check, c);
    if (std::isnan(most) && e.outcome == Outcome::compliant) e.outcome = Outcome::undefined;
    const bool holds = check == rail_min ? f.stress[check] >= most : f.stress[check] <= most;
    if (std::isnan(most) || holds) continue;
    e.outcome = Outcome::breaks_limits;
    e.broken.push_back(static_cast<std::int16_t>(check));
    e.shortfall.push_back(0.1);
    e.violation += 0.1;
  }
  return e;
}

Evaluation ProofLists::evaluate(const Choice& c, const Dominated& dominated) const {
  const Figures<double> f = figures(values_of(c), parts_[0][c[0]].value);
  Evaluation e = look(c);
  const auto stop = [&] { return dominated && (!e.broken.empty() || dominated(e.objectives)); };
  bool done = stop();
  const std::vector<double> exact = objectives(f);
  if (!done) e.objectives = exact;
  done = done || stop();
  for (const int check : {resistor_power, clamp_power, margin, dropper_voltage}) {
    if (done) break;
    const double most = allowed(check, c);
    if (std::isnan(most) && e.outcome == Outcome::compliant) e.outcome = Outcome::undefined;
    if (std::isnan(most) || f.stress[check] <= most) continue;
    e.outcome = Outcome::breaks_limits;
    e.broken.push_back(static_cast<std::int16_t>(check));
    e.shortfall.push_back((f.stress[check] - most) / std::max(0.1, std::abs(most)));
    e.violation += e.shortfall.back();
    done = static_cast<bool>(dominated);
  }
  e.complete = !done;
  return e;
}

Evaluation ProofLists::relaxed(const Choice& categories, const std::vector<double>& position) const {
  Values<double> v = values_of(Choice(7, 0));
  std::size_t axis = 0;
  for (int s = dropper; s <= reservoir; ++s) {
    if (space_.slots[s].coordinate.empty()) continue;
    const auto ends =
        std::minmax_element(space_.slots[s].coordinate.begin(), space_.slots[s].coordinate.end());
    v.value[s] = std::exp(*ends.first + position[axis++] * (*ends.second - *ends.first));
  }
  v.loss[reservoir] = 1;
  const Figures<double> f = figures(v, parts_[0][categories[0]].value);
  Evaluation e;
  e.outcome = Outcome::compliant;
  e.objectives = objectives(f);
  e.violation = std::max(0.0, shape_.least_margin - f.margin);
  return e;
}

Bounds ProofLists::bound(const Box& box, int depth) const {
  const Figures<Interval> f = figures(values_of(box), parts_[0][box.options[0][0]].value);
  const bool deep = depth > 0;
  const auto end = [this](Interval i, Fault swapped) { return fault_ == swapped ? i.high : i.low; };
  // In every other catalogue the margin is known by out_of_reach() only.
  const bool by_bound = deep && shape_.seed / 2 % 2 == 1;
  const Interval negated = Interval{0, 0} - f.margin;
  Bounds b;
  b.objectives = {end(f.cost, Fault::cost_high), deep ? end(f.loss, Fault::loss_high) : -infinity,
                  end(f.area, Fault::area_high), by_bound ? end(negated, Fault::margin_low) : -infinity};
  b.kinds = {BoundKind::exact, BoundKind::monotone, BoundKind::exact, BoundKind::theorem};
  b.objectives.resize(shape_.objectives);
  b.kinds.resize(shape_.objectives);
  for (int check = 0; check < checks; ++check) {
    if (!deep &&
        std::none_of(std::begin(list_checks), std::end(list_checks), [&](int c) { return c == check; }))
      continue;
    bool all_given = true;
    const Interval most = allowed(check, box, all_given);
    bool at_least = check == rail_min;
    if (fault_ == Fault::window_swapped && (check == rail_min || check == rail_max)) at_least = !at_least;
    const Interval have = f.stress[check];
    bool broken = at_least ? have.high < most.low : have.low > most.high;
    if (fault_ == Fault::broken_by_any) broken = at_least ? have.low < most.high : have.high > most.low;
    // A part without a rating breaks nothing, it is undefined: neither complies.
    if (!all_given && fault_ != Fault::unknown_breaks) broken = broken && most.low <= most.high;
    if (!all_given && fault_ == Fault::unknown_breaks) broken = true;
    if (!broken) continue;
    b.broken = check;
    b.broken_kind = deep ? BoundKind::theorem : BoundKind::exact;
  }
  return b;
}

bool ProofLists::out_of_reach(const Box& box, int objective, double value) const {
  if (objective != 3) return false;
  const Figures<Interval> f = figures(values_of(box), parts_[0][box.options[0][0]].value);
  return (fault_ == Fault::question_low ? -f.margin.low : -f.margin.high) >= value;
}

bool ProofLists::replaces(int slot, int better, int worse, const Figures<Interval>& f) const {
  const BoxPart &b = parts_[slot][better], &w = parts_[slot][worse];
  if (b.value != w.value || b.loss != w.loss || better == worse) return false;
  const bool area_counts = shape_.objectives >= 3;
  const bool dearer = fault_ == Fault::reduce_dearer ? b.price < w.price : b.price > w.price;
  if (dearer || (area_counts && b.area > w.area)) return false;
  if (fault_ != Fault::reduce_rating) {
    bool holds = b.rating == w.rating || b.rating > w.rating || std::isnan(w.rating);
    for (int check = 0; check < checks; ++check)
      if (rated_slot(check) == slot) holds = holds || b.rating >= f.stress[check].high;
    if (slot == reservoir && b.rating > not_computable) holds = false;
    if (slot == maker || slot <= stage) holds = true;
    if (!holds) return false;
  }
  if (b.price != w.price || (area_counts && b.area != w.area)) return true;
  return fault_ == Fault::reduce_first ? better > worse : better < worse;
}

double ProofLists::reduce(Box& box) const {
  const double before = box.members();
  const Figures<Interval> f = figures(values_of(box), parts_[0][box.options[0][0]].value);
  for (int s = stage; s < 7; ++s) {
    std::vector<std::int32_t> kept;
    for (const auto option : box.options[s]) {
      const bool replaced = std::any_of(box.options[s].begin(), box.options[s].end(),
                                        [&](std::int32_t other) { return replaces(s, other, option, f); });
      if (!replaced) kept.push_back(option);
    }
    // Faulty rules may replace in a circle.
    if (!kept.empty()) box.options[s] = kept;
  }
  return before - box.members();
}

}  // namespace toy
