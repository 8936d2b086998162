#include "dropfront/values/suggest.hpp"

#include <algorithm>
#include <cctype>

namespace dropfront::values {
namespace {

std::string lower(std::string_view text) {
  std::string low(text);
  for (char& c : low) c = static_cast<char>(std::tolower(static_cast<unsigned char>(c)));
  return low;
}

}  // namespace

int edit_distance(std::string_view a, std::string_view b) {
  const std::string s = lower(a);
  const std::string t = lower(b);
  const std::size_t n = t.size();
  std::vector<int> before(n + 1), previous(n + 1), current(n + 1);
  for (std::size_t j = 0; j <= n; ++j) previous[j] = static_cast<int>(j);
  for (std::size_t i = 1; i <= s.size(); ++i) {
    current[0] = static_cast<int>(i);
    for (std::size_t j = 1; j <= n; ++j) {
      const int replace = previous[j - 1] + (s[i - 1] == t[j - 1] ? 0 : 1);
      current[j] = std::min({replace, previous[j] + 1, current[j - 1] + 1});
      if (i > 1 && j > 1 && s[i - 1] == t[j - 2] && s[i - 2] == t[j - 1]) {
        current[j] = std::min(current[j], before[j - 2] + 1);
      }
    }
    before = previous;
    previous = current;
  }
  return previous[n];
}

std::optional<std::string> nearest_name(std::string_view found, const std::vector<std::string>& known) {
  const int allowed = std::max<int>(2, static_cast<int>(found.size()) / 3);
  std::optional<std::string> best;
  int best_distance = 0;
  for (const std::string& name : known) {
    const int distance = edit_distance(found, name);
    if (distance <= allowed && distance < static_cast<int>(std::max(found.size(), name.size())) &&
        (!best || distance < best_distance)) {
      best = name;
      best_distance = distance;
    }
  }
  if (best) return best;
  const std::string low = lower(found);
  for (const std::string& name : known) {
    if (low.size() >= 3 && (lower(name).starts_with(low) || low.starts_with(lower(name)))) return name;
  }
  return std::nullopt;
}

std::string did_you_mean(std::string_view found, const std::vector<std::string>& known) {
  const auto name = nearest_name(found, known);
  return name ? " (did you mean '" + *name + "'?)" : "";
}

}  // namespace dropfront::values
