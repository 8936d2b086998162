#include "dropfront/scoring/board_area.hpp"

#include "dropfront/scoring/bounds/placed.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Sum over the slots of the least count·(L + 2m)(W + 2m) any entry of the list places, m with the creepage
/// on mains-side slots. Exact, as the cost; a part without a size counts nothing.
std::optional<double> board_area(const BoxQuestion& question) {
  return least_placed(question, [&](const parts::PartInfo& info, bool mains_side) -> std::int64_t {
    if (!info.length_um || !info.width_um) return 0;
    const auto around_um = 2 * (mains_side ? question.context.mains_margin_um : kBoardMargin_um);
    return (*info.length_um + around_um) * (*info.width_um + around_um);
  });
}

}  // namespace dropfront::scoring::bounds
