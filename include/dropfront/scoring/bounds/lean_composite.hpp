#pragma once
#include <vector>

#include "dropfront/scoring/bounds/box.hpp"
#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/scoring/lean_case.hpp"
#include "dropfront/scoring/point_solver.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// The best that a box's parts could make together in the lean corner: values no member has all of, each the
/// best of its list and at the temperature that suits it. Series resistor, ESR and chain are given one by
/// one.
class LeanComposite {
 public:
  /// False where a part that every member must have is missing.
  static bool possible(const DesignBox& box);

  /// `required_V`: the least of the box. Everything must outlive it.
  LeanComposite(const DesignBox& box, const Requirement& requirement, const MainsShapes& shapes,
                double required_V, bool stepping);

  /// Those that differ in value.
  const std::vector<const parts::Resistor*>& series_resistors() const { return series_resistors_; }
  /// Whether both ends of the list of ESRs (chains) are to be tried: {false} where they are one.
  const std::vector<bool>& esr_ends() const { return esr_ends_; }
  const std::vector<bool>& chain_ends() const { return chain_ends_; }
  /// Ambients, the more telling one first.
  const std::vector<bool>& ambients() const { return ambients_; }

  /// What is chosen of all that is given one by one.
  struct Case {
    const parts::Resistor* series_resistor = nullptr;
    bool high_esr = false, high_chain = false, hot = false;
    LeanEnds ends;
  };
  struct Lean {
    circuit::ElementValues values;  ///< load left out
    double spare_A = 0;             ///< no clamp carries more, of what the load leaves
  };
  /// `load_A`: a rail current that is drawn at least: what it takes does not warm the clamp. `most`: rises
  /// that are known not to be exceeded.
  Lean lean(const Case& at, double load_A, const Rises& most) const;
  /// Rises no member exceeds: those that the composite's own state implies, and a little for what settling
  /// leaves open. The rises of `state` must not have been exceeded by any.
  Rises rises(const circuit::ElementValues& values, const circuit::SteadyState& state) const;

 private:
  /// Temperatures a part can have.
  struct Span {
    double cool_degC, warm_degC;
  };
  double greatest_F(const Span& air, const parts::Dropper*& which) const;
  circuit::ClampCurve greatest_curve(const Span& junction) const;
  double esr_ohm(End end, bool greatest, double air_degC) const;

  const DesignBox* box_;
  const Requirement* requirement_;
  const MainsShapes* shapes_;
  double required_V_;
  std::vector<const parts::Resistor*> series_resistors_;
  std::vector<bool> esr_ends_{false}, chain_ends_{false}, ambients_;
  Chain least_chain_, greatest_chain_;
};

/// No rail stands higher: the clamp's curve at no less than the greatest line current.
double rail_ceiling_V(const circuit::ElementValues& values);

}  // namespace dropfront::scoring
