#include "dropfront/scoring/evidence.hpp"

#include "dropfront/circuit/available_current.hpp"
#include "evidence_impl.hpp"

namespace dropfront::scoring {

Evidence::Evidence(const Design& design, const Requirement& requirement, const Supply& supply,
                   const MainsShapes& shapes)
    : impl_(std::make_unique<Impl>(design, requirement, supply, &shapes)) {}

Evidence::Evidence(const Design& design, const Requirement& requirement, const Supply& supply)
    : impl_(std::make_unique<Impl>(design, requirement, supply, nullptr)) {}

Evidence::~Evidence() = default;

const Design& Evidence::design() const { return impl_->design; }
const Requirement& Evidence::requirement() const { return *impl_->requirement; }
const Supply& Evidence::supply() const { return *impl_->supply; }
const MainsShapes& Evidence::shapes() const { return *impl_->shapes; }
const LoadProfile& Evidence::loads() const { return impl_->loads; }
double Evidence::required_rail_V() const { return impl_->required.value_or(0); }
int Evidence::steady_states() const { return impl_->points.steady_states(); }
int Evidence::transients() const { return impl_->transients; }

double Evidence::overhead_A(bool in_dropout) const {
  return impl_->overhead_A(in_dropout ? Quiescent::dropout : Quiescent::data);
}

const LeanAnswer& Evidence::lean() {
  auto& lean = impl_->lean;
  if (lean) return *lean;
  lean.emplace();
  if (!impl_->required) {
    lean->reason = "the rail the output stage needs is not given (input_min)";
    return *lean;
  }
  const auto& found = impl_->lean_search.least();
  lean->usable = found.usable;
  lean->reason = found.reason;
  lean->ambient_degC = found.where.ambient_degC;
  lean->hot_decides = found.where.ambient_degC == impl_->ambient_degC(true);
  lean->ends = ends_text(found.where.ends, impl_->bled());
  lean->available_A = found.available_A;
  const auto warm = found.rises.over(lean->ambient_degC);
  lean->local_degC = warm.local_degC;
  lean->clamp_junction_degC = warm.clamp_junction_degC;
  if (!found.usable) return *lean;
  auto& solver = impl_->lean_search.solver();
  lean->values = impl_->points.values(solver.recipe(found.where.ends), found.rises, lean->ambient_degC);
  lean->values.rail_current_A = found.best_A;
  lean->capability_A = solver.capability_A(found);
  lean->margin_A = lean->capability_A - impl_->loads.heaviest_output_A();
  return *lean;
}

std::optional<double> Evidence::margin_at_A(double age) {
  if (age == 1) return lean().usable ? std::optional(lean().margin_A) : std::nullopt;
  auto& known = impl_->margin_new;
  if (age == 0 && known) return *known;
  std::optional<double> margin;
  if (impl_->required) {
    LeanSearch search(impl_->points, impl_->shapes->lean, impl_->overhead_A(Quiescent::data), age);
    const auto& found = search.least();
    if (found.usable) margin = search.solver().capability_A(found) - impl_->loads.heaviest_output_A();
  }
  if (age == 0) known = margin;
  return margin;
}

std::optional<double> Evidence::margin_new_A() { return margin_at_A(0); }

const OperatingPoint& Evidence::lean_cold() { return impl_->lean_point(false); }
const OperatingPoint& Evidence::lean_hot() { return impl_->lean_point(true); }

std::optional<double> Evidence::lean_current_at_A(double rail_V) {
  if (!impl_->required || !(rail_V > 0)) return std::nullopt;
  return impl_->lean_search.current_at_A(rail_V);
}

const PlugInAnswer& Evidence::plug_in() {
  auto& answer = impl_->plug_in;
  if (!answer) {
    answer =
        run_plug_ins(impl_->points, rich_recipe(*impl_->shapes), impl_->all_at_rest(), impl_->transients);
  }
  return *answer;
}

const SurgeAnswer& Evidence::surge() {
  auto& answer = impl_->surge;
  if (!answer) {
    answer = run_surges(impl_->points, rich_recipe(*impl_->shapes), impl_->all_at_rest(),
                        impl_->requirement->limits.surge.value_or(Surge{}), impl_->transients);
  }
  return *answer;
}

std::optional<double> Evidence::available_A(const OperatingPoint& point) {
  auto& search = impl_->lean_search;
  if (!impl_->required || !point.state.usable()) return std::nullopt;
  if (point.corner == "lean_cold" || point.corner == "lean_hot") {
    const auto& found = search.at(point.corner == "lean_hot");
    return found.usable ? std::optional(found.available_A) : std::nullopt;
  }
  const bool with_tolerance = point.corner != "nominal";
  const auto required_V = scoring::required_rail_V(*impl_->design.output_stage, impl_->requirement->output,
                                                   impl_->loads, with_tolerance);
  const auto found =
      circuit::find_available_current(impl_->design.arrangement->build, point.values, required_V.value_or(0));
  impl_->points.count(found.steady_states);
  return found.usable ? std::optional(found.current_A) : std::nullopt;
}

}  // namespace dropfront::scoring
