#pragma once
#include <cstdint>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/problem/confirm.hpp"
#include "dropfront/problem/conflict.hpp"
#include "dropfront/problem/problem.hpp"
#include "dropfront/scoring/score.hpp"
#include "dropfront/search/search.hpp"

namespace dropfront::report {

enum class Status { done, none_found, proven_none, cut_short };

/// A front member or a filled-in ranked design with what people want to know of it.
struct Entry {
  int number = 0;  ///< from 1; ranked designs off the front are numbered after it
  scoring::Design design;
  scoring::Objectives objectives;
  std::string tightest_check;
  std::optional<double> tightest_headroom;
  bool tightest_inside = false;  ///< it is tightest inside the tolerances, where no corner stands
  std::string tightest_supply;   ///< where that check was worst; empty with one unnamed supply
  std::string standby_supply;    ///< with the greatest standby loss
  std::string margin_supply;     ///< with the least margin
  bool on_front = true;
  std::optional<scoring::Score> evidence;             ///< ranked designs only
  std::optional<problem::Confirmation> confirmation;  ///< ranked designs, once confirmed
  struct Alternative {
    std::string slot;
    std::vector<std::string> parts;  ///< electrically equal, not better in price or size
  };
  std::vector<Alternative> alternatives;  ///< second sources
};

/// The front member of one arrangement with the least standby loss, at work: what an arrangement gains asleep
/// and what it costs awake. First supply where there are several; nominal values.
struct ArrangementBest {
  std::string arrangement;
  int number = 0;
  std::optional<double> standby_loss_W;  ///< the objective
  double asleep_input_W = 0, awake_input_W = 0;
  double awake_ripple_Vpp = 0;
  std::optional<double> firing_spike_A;  ///< drawn from the line at every firing; shunts only
};

struct RankedList {
  std::string name;  ///< cheapest, lowest_standby, smallest, most_margin, balanced
  std::vector<int> numbers;
};

/// One finished search, ready for the writers. Pure data; `problem` outlives it.
struct Result {
  const problem::Problem* problem = nullptr;
  std::string version;  ///< of the program
  Status status = Status::done;
  search::SearchCounts counts;
  std::uint64_t seed = 1;
  std::string effort = "normal";
  bool closed = true;                    ///< no one-part change of a front member was left untried
  std::optional<search::Proof> proof;    ///< of a proof made or tried
  std::vector<std::string> check_names;  ///< of its counts by limit
  std::vector<Entry> front;
  std::vector<Entry> extras;  ///< ranked, not on the front
  std::vector<RankedList> ranked;
  std::vector<ArrangementBest> arrangements;  ///< of each arrangement on the front, where there are several
  struct NearMiss {
    scoring::Design design;
    std::string check;
    double shortfall = 0;
    std::optional<scoring::Check> broken;  ///< the check as that design meets it
  };
  std::vector<NearMiss> near_misses;
  struct Conflict {
    std::string check;
    std::int64_t failed = 0;
    double least_shortfall = 0;
    std::optional<scoring::Check> closest;  ///< the check as the design that came closest meets it
  };
  std::vector<Conflict> conflict;  ///< most often failed first; filled when nothing complies
  /// Limits that cannot hold together, each with the design that relaxing it alone would admit.
  struct Explained {
    problem::ConflictSet set;
    std::vector<std::optional<scoring::Design>> designs;  ///< one a limit of the set
  };
  std::optional<Explained> explained;
  std::vector<std::string> cautions;
};

/// Whether every design of the space is accounted for.
bool proven(const Result& result);

/// The entry of that number, on the front or off it; null if there is none.
const Entry* find_entry(const Result& result, int number);

}  // namespace dropfront::report
