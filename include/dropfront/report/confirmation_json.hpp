#pragma once
#include <optional>

#include "dropfront/problem/confirm.hpp"
#include "dropfront/report/json_writer.hpp"

namespace dropfront::report {

/// Member "confirmation" of an evidence document; null when the design was not confirmed.
void write_confirmation(JsonWriter& json, const std::optional<problem::Confirmation>& confirmation);

}  // namespace dropfront::report
