#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace dropfront::values {

/// Edits (insert, drop, replace, swap neighbours) that turn one text into the other, letter case ignored.
int edit_distance(std::string_view a, std::string_view b);

/// The name of `known` nearest to `found`, when near enough to be a slip (a third of its length, at least 2
/// edits, or one begins with the other). Ties: the first listed.
std::optional<std::string> nearest_name(std::string_view found, const std::vector<std::string>& known);

/// " (did you mean 'x'?)", or nothing when no name is near: to put behind a message.
std::string did_you_mean(std::string_view found, const std::vector<std::string>& known);

}  // namespace dropfront::values
