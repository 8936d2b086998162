#pragma once
#include <optional>

#include "dropfront/parts/output_stage.hpp"
#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/load_profile.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// Quiescent current to take: data give a maximum, so the least is 0.
enum class Quiescent { least, data, dropout };

/// Output voltage at an end of the stage's own tolerance.
double stage_output_V(const parts::OutputStage& stage, End output);

/// Rail current an output stage draws for an output current, without leakage and rail loads.
///   direct, linear: I = I_out + Iq;   step-down: I = V_out·I_out/(eta·v) + Iq
/// `rail_V` > 0 counts for step-down only, and so does `output`, the end of its tolerance the stage stands
/// at. The load is a current, so the power is proportional to V_out, and so is the rail current: the upper
/// end wherever the supply must carry it (lean, start, the loads of the rich corners), the lower end where
/// less load is worse.
double stage_current_A(const parts::OutputStage& stage, double output_A, double rail_V, Quiescent quiescent,
                       End output = End::high);

/// Quiescent current by choice; in dropout the greater of the two.
double quiescent_A(const parts::OutputStage& stage, Quiescent quiescent);

/// Rail voltage the stage itself needs: linear output·(1 + tol) + dropout (`with_tolerance` false: without
/// tol), direct output.voltage·(1 - tolerance), step-down input_min. Absent: input_min not given.
std::optional<double> stage_required_V(const parts::OutputStage& stage, const OutputNeed& need,
                                       bool with_tolerance);

/// V_required: the greater of the stage's own and the stated minima of always-on rail loads. Absent: none.
std::optional<double> required_rail_V(const parts::OutputStage& stage, const OutputNeed& need,
                                      const LoadProfile& profile, bool with_tolerance = true);

}  // namespace dropfront::scoring
