#include "dropfront/problem/names.hpp"

namespace dropfront::problem {

std::string_view objective_name(scoring::Objective objective) {
  switch (objective) {
    case scoring::Objective::cost:
      return "cost";
    case scoring::Objective::standby_loss:
      return "standby_loss";
    case scoring::Objective::board_area:
      return "board_area";
    case scoring::Objective::current_margin:
      return "current_margin";
  }
  return "";
}

const std::vector<scoring::Objective>& all_objectives() {
  using scoring::Objective;
  static const std::vector<Objective> all{Objective::cost, Objective::standby_loss, Objective::board_area,
                                          Objective::current_margin};
  return all;
}

std::string_view connection_name(scoring::ConnectionKind kind) {
  switch (kind) {
    case scoring::ConnectionKind::plug:
      return "plug";
    case scoring::ConnectionKind::switched:
      return "switched";
    case scoring::ConnectionKind::fixed:
      return "fixed";
  }
  return "";
}

}  // namespace dropfront::problem
