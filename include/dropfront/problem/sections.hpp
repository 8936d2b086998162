#pragma once
#include "dropfront/problem/cursor.hpp"
#include "dropfront/problem/problem.hpp"

namespace dropfront::problem {

/// One section of the problem file each, into `problem.requirement` and the settings beside it; defaults and
/// cautions are noted on the way. All throw values::InputError.
void read_mains(const Cursor& mains, Problem& problem);
void read_output(const Cursor& output, Problem& problem);
void read_surroundings(const Cursor& surroundings, Problem& problem);
void read_connection(const Cursor& connection, Problem& problem);
void read_limits(const Cursor& limits, Problem& problem);  ///< after the connection: its kind sets the rule
void read_derating(const Cursor& derating, Problem& problem);
/// Volume, currency, placement cost, missing ratings, objectives, resolution, top, effort, seed.
void read_settings(ObjectReader& problem_reader, Problem& problem);
/// Reads the lists (`parts`, relative to the folder `base`), then fills `problem.offers`. After the output.
void read_parts(const Cursor& folders, const std::string& base, Problem& problem);
void read_slots(const Cursor& slots, Problem& problem);

/// All of a problem but its parts and slots: enough to score a design whose numbers are inline.
void read_asked(ObjectReader& problem_reader, Problem& problem);
/// A design, parts by name or inline; inline ones are added to the problem's derived parts.
scoring::Design read_design(const Cursor& design, Problem& problem);

}  // namespace dropfront::problem
