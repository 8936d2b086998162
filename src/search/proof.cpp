#include "dropfront/search/proof.hpp"

#include <numeric>

namespace dropfront::search {
namespace {

double sum(const ByKind& counts) { return std::accumulate(counts.begin(), counts.end(), 0.0); }

}  // namespace

double Proof::settled() const {
  double total = sum(reduced) + undefined + sum(dominated) + scored;
  for (const ByKind& check : broken) total += sum(check);
  return total;
}

BoundKind Proof::weakest() const {
  for (const BoundKind kind : {BoundKind::monotone, BoundKind::theorem}) {
    const auto k = static_cast<std::size_t>(kind);
    bool used = reduced[k] > 0 || dominated[k] > 0;
    for (const ByKind& check : broken) used = used || check[k] > 0;
    if (used) return kind;
  }
  return BoundKind::exact;
}

}  // namespace dropfront::search
