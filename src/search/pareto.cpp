#include "dropfront/search/pareto.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "dropfront/search/objective_key.hpp"

namespace dropfront::search {
namespace {

constexpr int leaf_size = 24;
constexpr double infinity = std::numeric_limits<double>::infinity();

bool less_raw(const ParetoArchive::Member& a, const ParetoArchive::Member& b) {
  if (a.objectives != b.objectives) return a.objectives < b.objectives;
  return a.choice < b.choice;
}

// Componentwise a <= b.
bool within(const std::vector<double>& a, const std::vector<double>& b) {
  for (std::size_t k = 0; k < a.size(); ++k)
    if (!(a[k] <= b[k])) return false;
  return true;
}

}  // namespace

ParetoArchive::ParetoArchive(std::vector<double> resolution) : resolution_(std::move(resolution)) {
  Node root;
  root.low.assign(resolution_.size(), infinity);
  root.high.assign(resolution_.size(), -infinity);
  nodes_.push_back(std::move(root));
}

bool ParetoArchive::node_rejects(int index, const Member& query) const {
  const Node& node = nodes_[index];
  if (!within(node.low, query.keys)) return false;
  if (node.left >= 0) return node_rejects(node.left, query) || node_rejects(node.right, query);
  for (int i : node.members) {
    const Member& m = members_[i];
    if (!within(m.keys, query.keys)) continue;
    if (m.keys != query.keys) return true;
    if (!less_raw(query, m)) return true;
  }
  return false;
}

bool ParetoArchive::rejects(const std::vector<double>& objectives, const Choice& choice) const {
  Member query;
  query.objectives = objectives;
  query.choice = choice;
  query.keys.resize(objectives.size());
  for (std::size_t k = 0; k < objectives.size(); ++k)
    query.keys[k] = std::isnan(objectives[k]) ? -infinity : objective_key(objectives[k], resolution_[k]);
  return node_rejects(0, query);
}

void ParetoArchive::least_beyond(int index, const std::vector<double>& keys, int k, double& least) const {
  const Node& node = nodes_[index];
  const auto within_others = [&](const std::vector<double>& member) {
    for (int j = 0; j < static_cast<int>(keys.size()); ++j)
      if (j != k && !(member[j] <= keys[j])) return false;
    return true;
  };
  if (!within_others(node.low)) return;
  if (node.left >= 0) {
    least_beyond(node.left, keys, k, least);
    least_beyond(node.right, keys, k, least);
  }
  for (int i : node.members)
    if (within_others(members_[i].keys)) least = std::min(least, members_[i].objectives[k]);
}

double ParetoArchive::surely_rejected_from(const std::vector<double>& bound, int k) const {
  std::vector<double> keys(bound.size());
  for (std::size_t j = 0; j < bound.size(); ++j)
    keys[j] = std::isnan(bound[j]) ? -infinity : objective_key(bound[j], resolution_[j]);
  double least = infinity;
  least_beyond(0, keys, k, least);
  // A hair more than a step, so that rounding cannot bring the two keys together.
  return std::nextafter(least + 1.000001 * resolution_[k], infinity);
}

void ParetoArchive::refresh(Node& node) const {
  std::fill(node.low.begin(), node.low.end(), infinity);
  std::fill(node.high.begin(), node.high.end(), -infinity);
  const auto take = [&node](const std::vector<double>& low, const std::vector<double>& high) {
    for (std::size_t k = 0; k < low.size(); ++k) {
      node.low[k] = std::min(node.low[k], low[k]);
      node.high[k] = std::max(node.high[k], high[k]);
    }
  };
  if (node.left >= 0) {
    take(nodes_[node.left].low, nodes_[node.left].high);
    take(nodes_[node.right].low, nodes_[node.right].high);
  }
  for (int i : node.members) take(members_[i].keys, members_[i].keys);
}

void ParetoArchive::remove_dominated(int index, const Member& newcomer, std::vector<std::int64_t>* removed) {
  Node& node = nodes_[index];
  if (!within(newcomer.keys, node.high)) return;
  if (node.left >= 0) {
    remove_dominated(node.left, newcomer, removed);
    remove_dominated(node.right, newcomer, removed);
  } else {
    std::size_t kept = 0;
    for (int i : node.members) {
      Member& m = members_[i];
      if (!within(newcomer.keys, m.keys)) {
        node.members[kept++] = i;
        continue;
      }
      m.alive = false;
      --alive_;
      if (removed) removed->push_back(m.tag);
    }
    if (kept == node.members.size()) return;
    node.members.resize(kept);
  }
  refresh(node);
}

void ParetoArchive::split_leaf(int index, int depth) {
  const int dimensions = static_cast<int>(resolution_.size());
  for (int step = 0; step < dimensions; ++step) {
    const int d = (depth + step) % dimensions;
    if (!(nodes_[index].low[d] < nodes_[index].high[d])) continue;
    std::vector<double> values;
    for (int i : nodes_[index].members) values.push_back(members_[i].keys[d]);
    std::sort(values.begin(), values.end());
    double split = values[values.size() / 2];
    if (!(values.front() < split)) split = *std::upper_bound(values.begin(), values.end(), split);
    Node left, right;
    left.low = left.high = right.low = right.high = nodes_[index].low;
    for (int i : nodes_[index].members) (members_[i].keys[d] < split ? left : right).members.push_back(i);
    refresh(left);
    refresh(right);
    nodes_[index].members.clear();
    nodes_[index].dimension = d;
    nodes_[index].split = split;
    nodes_[index].left = static_cast<int>(nodes_.size());
    nodes_[index].right = nodes_[index].left + 1;
    nodes_.push_back(std::move(left));
    nodes_.push_back(std::move(right));
    return;
  }
}

void ParetoArchive::place(int member) {
  const std::vector<double>& keys = members_[member].keys;
  int index = 0;
  int depth = 0;
  for (;; ++depth) {
    Node& node = nodes_[index];
    for (std::size_t k = 0; k < keys.size(); ++k) {
      node.low[k] = std::min(node.low[k], keys[k]);
      node.high[k] = std::max(node.high[k], keys[k]);
    }
    if (node.left < 0) break;
    index = keys[node.dimension] < node.split ? node.left : node.right;
  }
  nodes_[index].members.push_back(member);
  if (nodes_[index].members.size() > leaf_size) split_leaf(index, depth);
}

bool ParetoArchive::insert(const std::vector<double>& objectives, const Choice& choice, std::int64_t tag,
                           std::vector<std::int64_t>* removed) {
  for (double value : objectives)
    if (std::isnan(value)) return false;
  Member newcomer;
  newcomer.objectives = objectives;
  newcomer.choice = choice;
  newcomer.keys = objective_keys(objectives, resolution_);
  newcomer.tag = tag;
  if (node_rejects(0, newcomer)) return false;
  remove_dominated(0, newcomer, removed);
  members_.push_back(std::move(newcomer));
  ++alive_;
  place(static_cast<int>(members_.size()) - 1);
  return true;
}

std::vector<std::int64_t> ParetoArchive::tags() const {
  std::vector<std::int64_t> result;
  for (const Member& m : members_)
    if (m.alive) result.push_back(m.tag);
  return result;
}

std::vector<std::int64_t> ParetoArchive::ends() const {
  std::vector<std::int64_t> result;
  const std::vector<const Member*> members = sorted();
  for (std::size_t k = 0; k < resolution_.size() && !members.empty(); ++k)
    result.push_back(
        (*std::min_element(members.begin(), members.end(), [k](const Member* a, const Member* b) {
          return a->objectives[k] < b->objectives[k];
        }))->tag);
  return result;
}

std::vector<const ParetoArchive::Member*> ParetoArchive::sorted() const {
  std::vector<const Member*> result;
  for (const Member& m : members_)
    if (m.alive) result.push_back(&m);
  std::sort(result.begin(), result.end(), [](const Member* a, const Member* b) { return less_raw(*a, *b); });
  return result;
}

}  // namespace dropfront::search
