#include "dropfront/problem/box_binding.hpp"

#include <algorithm>
#include <limits>

#include "dropfront/problem/cost_area.hpp"
#include "dropfront/problem/design_box.hpp"
#include "dropfront/problem/score_view.hpp"
#include "dropfront/scoring/bounds/box_bounder.hpp"
#include "dropfront/scoring/bounds/lean_reach.hpp"

namespace dropfront::problem {
namespace {

constexpr double kUnknown = -std::numeric_limits<double>::infinity();

/// More than twice what the stop tolerances of steady states and of the available current leave uncertain in
/// a member's own figures, and orders below any resolution worth asking for.
constexpr double kSlack = 2e-8;

search::BoundKind kind_of(scoring::BoundClass known) {
  switch (known) {
    case scoring::BoundClass::exact:
      return search::BoundKind::exact;
    case scoring::BoundClass::theorem:
      return search::BoundKind::theorem;
    case scoring::BoundClass::monotone:
      break;
  }
  return search::BoundKind::monotone;
}

class Boxes : public search::Bounder {
 public:
  explicit Boxes(const Problem& problem)
      : problem_(problem),
        slots_(make_space(problem.offers)),
        view_(problem.requirement),
        cost_area_(problem, slots_),
        bounder_(problem.requirement),
        reach_(problem.requirement),
        wanted_margin_A_(problem.requirement.limits.current_margin *
                         scoring::load_profile(problem.requirement.output).heaviest_output_A()),
        margin_asked_(std::count(problem.requirement.objectives.begin(), problem.requirement.objectives.end(),
                                 scoring::Objective::current_margin) > 0) {}

  search::Bounds bound(const search::Box& box, int depth) const override {
    scoring::BoxBound found;  // nothing known
    if (single_parts()) found = known(box, depth);
    return as_bounds(found, box, depth);
  }

  search::Bounds outlook(const search::Box& box) const override {
    scoring::BoxBound found;
    if (single_parts()) found = bounder_.outlook(design_box(problem_.offers, slots_.ids, box));
    return as_bounds(found, box, 0);
  }

  bool out_of_reach(const search::Box& box, int objective, double value) const override {
    if (problem_.requirement.objectives[objective] != scoring::Objective::current_margin) return false;
    if (problem_.offers.droppers.empty()) return false;
    return reach_.out_of_reach(design_box(problem_.offers, slots_.ids, box), -value - kSlack);
  }

  Limit limit_on(int objective) const override {
    if (problem_.requirement.objectives[objective] != scoring::Objective::current_margin) return {};
    return {-wanted_margin_A_, check_index("supply.margin")};
  }

  double reduce(search::Box& box) const override {
    if (!single_parts()) return 0;
    scoring::DesignBox parts = design_box(problem_.offers, slots_.ids, box);
    const double before = box.members();
    if (!(bounder_.reduce(parts) > 0)) return 0;
    keep_parts(problem_.offers, slots_.ids, parts, box);
    return before - box.members();
  }

 private:
  search::Bounds as_bounds(const scoring::BoxBound& found, const search::Box& box, int depth) const {
    search::Bounds out;
    out.shares = found.shares;
    for (const scoring::Objective objective : problem_.requirement.objectives) add(objective, found, out);
    if (depth == 0 && found.broken.empty()) add_corners(box, out);
    if (!found.broken.empty()) out.broken = check_index(found.broken);
    out.broken_kind = kind_of(found.broken_class);
    return out;
  }

  /// -1: no such check.
  int check_index(std::string_view id) const {
    const auto& names = view_.check_names();
    const auto at = std::find(names.begin(), names.end(), id);
    return at == names.end() ? -1 : static_cast<int>(at - names.begin());
  }

  scoring::BoxBound known(const search::Box& box, int depth) const {
    const scoring::DesignBox parts = design_box(problem_.offers, slots_.ids, box);
    scoring::BoxBound found = bounder_.bound(parts, depth, depth);
    // Where the margin is an objective its limit is asked for together with the front.
    if (depth == 1 && found.broken.empty() && !margin_asked_ &&
        reach_.out_of_reach(parts, wanted_margin_A_)) {
      found.broken = "supply.margin";
      found.broken_class = scoring::BoundClass::monotone;
    }
    return found;
  }

  /// The bounds are derived for one dropper and one series resistor a design; the resistive yardstick has
  /// none.
  bool single_parts() const {
    return !problem_.offers.droppers.empty() && problem_.offers.dropper_parallel == 1 &&
           problem_.offers.series_resistor_split == 1;
  }

  static void add(scoring::Objective objective, const scoring::BoxBound& found, search::Bounds& out) {
    using search::BoundKind;
    const auto put = [&](bool known, double value, BoundKind kind) {
      out.objectives.push_back(known ? value : kUnknown);
      out.kinds.push_back(kind);
    };
    // Divided as in ScoreView: equal integers give equal doubles.
    const auto millionths = [&](const std::optional<std::int64_t>& sum) {
      put(sum.has_value(), static_cast<double>(sum.value_or(0)) / 1e6, BoundKind::exact);
    };
    switch (objective) {
      case scoring::Objective::cost:
        return millionths(found.cost_micro);
      case scoring::Objective::board_area:
        return millionths(found.board_area_um2);
      case scoring::Objective::standby_loss:
        return put(found.standby_loss_W.has_value(), found.standby_loss_W.value_or(0) - kSlack,
                   kind_of(found.standby_class));
      case scoring::Objective::current_margin:
        return put(found.current_margin_A.has_value(), -found.current_margin_A.value_or(0) - kSlack,
                   kind_of(found.margin_class));
    }
  }

  /// Cost and area together, where both are asked for.
  void add_corners(const search::Box& box, search::Bounds& out) const {
    const auto& objectives = problem_.requirement.objectives;
    const auto place = [&](scoring::Objective objective) {
      return std::find(objectives.begin(), objectives.end(), objective) - objectives.begin();
    };
    const auto cost = static_cast<std::size_t>(place(scoring::Objective::cost));
    const auto area = static_cast<std::size_t>(place(scoring::Objective::board_area));
    if (cost == objectives.size() || area == objectives.size()) return;
    for (const CostArea::Step& step : cost_area_.steps(box)) {
      std::vector<double> corner(objectives.size(), kUnknown);
      corner[cost] = static_cast<double>(step.cost_micro) / 1e6;
      corner[area] = static_cast<double>(step.area_um2) / 1e6;
      out.corners.push_back(std::move(corner));
    }
  }

  const Problem& problem_;
  SlotSpace slots_;
  ScoreView view_;
  CostArea cost_area_;
  scoring::BoxBounder bounder_;
  scoring::LeanReach reach_;
  double wanted_margin_A_;
  bool margin_asked_;
};

}  // namespace

std::unique_ptr<search::Bounder> bind_bounds(const Problem& problem) {
  return std::make_unique<Boxes>(problem);
}

}  // namespace dropfront::problem
