#include "dropfront/problem/binding.hpp"

#include <cmath>

#include "dropfront/problem/relaxed_design.hpp"
#include "dropfront/problem/score_view.hpp"
#include "dropfront/problem/slot_space.hpp"
#include "dropfront/scoring/score.hpp"

namespace dropfront::problem {
namespace {

using scoring::Depth;

class Bound : public BoundProblem {
 public:
  explicit Bound(const Problem& problem)
      : problem_(problem),
        slots_(make_space(problem.offers)),
        scorer_(problem.requirement),
        view_(problem.requirement),
        relaxed_(problem, slots_),
        stress_(problem.requirement) {}

  const search::Space& space() const override { return slots_.space; }
  int objective_count() const override { return static_cast<int>(problem_.requirement.objectives.size()); }
  const std::vector<double>& resolution() const override { return problem_.resolution; }
  const std::vector<std::string>& check_names() const override { return view_.check_names(); }
  const Problem& problem() const override { return problem_; }
  scoring::Design design(const search::Choice& choice) const override {
    return design_of(problem_.offers, slots_.ids, choice);
  }

  search::Evaluation look(const search::Choice& choice) const override {
    return view_.evaluation(scorer_.score(design(choice), Depth::cheap));
  }

  search::Evaluation evaluate(const search::Choice& choice,
                              const search::Dominated& dominated) const override {
    if (!dominated) return view_.evaluation(scorer_.score(design(choice), Depth::full));
    const auto stop = [&](const scoring::Objectives& known) { return dominated(view_.objectives(known)); };
    return view_.evaluation(scorer_.score(design(choice), Depth::compliant, stop));
  }

  search::Evaluation relaxed(const search::Choice& categories,
                             const std::vector<double>& position) const override {
    RelaxedParts parts;
    const scoring::Design design = relaxed_.make(categories, position, parts);
    search::Evaluation evaluation = view_.evaluation(scorer_.score(design, Depth::screen));
    fill_unknown(design, evaluation);
    return evaluation;
  }

 private:
  /// Finite stand-ins where the screen gave no figure, never better than what such a design can reach.
  void fill_unknown(const scoring::Design& design, search::Evaluation& evaluation) const {
    const scoring::Requirement& requirement = problem_.requirement;
    for (std::size_t k = 0; k < evaluation.objectives.size(); ++k) {
      double& value = evaluation.objectives[k];
      if (std::isfinite(value)) continue;
      evaluation.violation += 1;
      value = 0;
      if (requirement.objectives[k] == scoring::Objective::standby_loss) {
        // The most real power a capacitor in series with a resistance can take: half of V·I. A resistor
        // behind a diode takes half of V²/R.
        value = stress_.line_Vrms() * relaxed_.current_Arms(design) / 2;
      } else if (requirement.objectives[k] == scoring::Objective::current_margin) {
        for (const scoring::Load& load : requirement.output.loads) value = std::max(value, load.current_A);
      }
    }
  }

  const Problem& problem_;
  SlotSpace slots_;
  scoring::Scorer scorer_;
  ScoreView view_;
  RelaxedDesigns relaxed_;
  Stress stress_;
};

}  // namespace

std::unique_ptr<BoundProblem> bind(const Problem& problem) { return std::make_unique<Bound>(problem); }

}  // namespace dropfront::problem
