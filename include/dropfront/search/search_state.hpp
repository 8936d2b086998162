#pragma once
#include <atomic>
#include <chrono>
#include <string>
#include <vector>

#include "dropfront/search/achievement.hpp"
#include "dropfront/search/axis.hpp"
#include "dropfront/search/choice_codec.hpp"
#include "dropfront/search/effort.hpp"
#include "dropfront/search/front_gauge.hpp"
#include "dropfront/search/ledger.hpp"
#include "dropfront/search/local_model.hpp"
#include "dropfront/search/option_record.hpp"
#include "dropfront/search/parallel.hpp"

namespace dropfront::search {

/// A design that passed its look and may reach the front.
struct Looked {
  Choice choice;
  std::vector<double> objectives;  ///< NaN where a look does not tell
  std::size_t origin = 0;          ///< index of its choice in the list that was looked at
};

/// An evaluation's mark on the ledger.
struct Merged {
  Choice choice;
  Entered entered;
  std::vector<double> quantities;  ///< see SearchState::quantities_of
};

/// What the stages of one search share: the memo of designs, the ledger, the limits, the threads.
class SearchState {
 public:
  SearchState(const Evaluator& evaluator, const SearchOptions& options);

  const Evaluator& evaluator;
  const Space& space;
  const SearchOptions& options;
  EffortPlan plan;
  std::vector<Axis> axes;
  ChoiceCodec codec;
  Workers workers;
  Ledger ledger;
  LocalModel model;
  LocalModel relaxed_model;  ///< of relaxed designs: a stand-in where real ones are too few
  OptionRecord record;

  /// Looks at the choices not seen before, as far as the budget goes, and returns those that stay in play.
  std::vector<Looked> look_new(const std::vector<Choice>& choices);

  /// Evaluates in batches; the front that an evaluation may stop at is the one before its batch. Keeps to the
  /// effort's limit of evaluations and stops between batches when the search ends.
  std::vector<Merged> evaluate(const std::vector<Choice>& choices);

  /// Evaluates without merging anything.
  std::vector<Evaluation> evaluate_apart(const std::vector<Choice>& choices, const Dominated& dominated);

  /// True once the stop flag is set or the given time is over. Asks the clock only when a time was given.
  bool ended();
  /// The same, without taking note: safe from several threads.
  bool over() const;
  const std::atomic<bool>& halted() const { return halted_; }
  /// Whether a design was looked at, or its evaluation begun, by look_new() and evaluate(). Safe from several
  /// threads at once while neither runs.
  bool seen(const Choice& choice) const { return seen_.contains(choice); }
  bool evaluated(const Choice& choice) const { return evaluated_.contains(choice); }
  bool may_look() const { return ledger.counts().looked < plan.looks; }
  bool may_evaluate() const { return evaluations_ < plan.evaluations; }
  std::int64_t evaluations() const { return evaluations_; }
  void lift_evaluation_limit();  ///< for enumeration
  void report(const std::string& stage, double fraction);

  /// Positions on the axes of a choice.
  std::vector<double> position_of(const Choice& choice) const;
  /// Number of the choice's combination of category options.
  std::int64_t region_of(const Choice& choice) const;

  /// What the model learns of an evaluation: objectives, then headrooms; NaN where unknown.
  std::vector<double> quantities_of(const Evaluation& evaluation) const;
  /// The front as it is, measured on at least a tenth of the extent of the compliant designs seen so far,
  /// relaxed ones included.
  FrontGauge gauge() const;
  ObjectiveRange compliant_range;

  /// Checks that evaluations have broken often enough to be worth foreseeing.
  std::vector<int> telling_checks() const;

  bool looks_refused = false;  ///< the budget kept a design from being looked at
  bool pairs_refused = false;  ///< the budget kept two-part changes from being made

 private:
  void learn(const Choice& choice, const Evaluation& evaluation);

  ChoiceSet seen_, evaluated_;
  std::vector<int> categories_;
  std::vector<std::int64_t> broken_in_evaluation_;
  std::int64_t evaluations_ = 0;
  std::atomic<bool> halted_{false};
  std::chrono::steady_clock::time_point deadline_;
};

}  // namespace dropfront::search
