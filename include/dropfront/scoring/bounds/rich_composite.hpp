#pragma once
#include <memory>

#include "dropfront/scoring/bounds/bound_context.hpp"
#include "dropfront/scoring/evidence.hpp"

namespace dropfront::scoring {

struct BoxQuestion;

/// The design least stressed in the rich corners and at plug-in that a box's parts could make together:
/// values no member has all of, each the mildest of its list, worked out by the score's own corners. A list
/// of one keeps its part, so that a box of one design is worked out as itself.
///
/// Mildest (monotone by test): least dropper, lowest clamp curve at every junction temperature, greatest
/// reservoir and leakage, least ESR, greatest ratings. What a series resistor, a loss or a chain warms the
/// enclosure by counts against what it takes from the clamp: these, and the rectifiers, must be alike.
class RichComposite {
 public:
  /// Whether something can be said: see above; no clamp's voltage falls with its temperature, or what heats
  /// it less would raise it; behind the dropper at most 0.4 of the crest, so that power grows with the
  /// clamp's voltage.
  static bool possible(const BoxQuestion& question);

  explicit RichComposite(const BoxQuestion& question);
  RichComposite(const RichComposite&) = delete;
  RichComposite& operator=(const RichComposite&) = delete;

  Evidence& evidence() { return *evidence_; }

 private:
  void take_dropper(const BoxQuestion& question);
  void take_clamp(const BoxQuestion& question);
  void take_reservoir(const BoxQuestion& question);
  void take_stage(const BoxQuestion& question);

  parts::Dropper dropper_;
  parts::Clamp clamp_;
  parts::Reservoir reservoir_;
  parts::OutputStage stage_;
  Design design_;
  std::unique_ptr<Evidence> evidence_;
};

}  // namespace dropfront::scoring
