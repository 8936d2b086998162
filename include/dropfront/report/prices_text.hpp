#pragma once
#include <string>

#include "dropfront/report/json_writer.hpp"
#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// What a little more of each limit costs along the front (problem/limit_prices.hpp), for people: the first,
/// the middle and the last step of each. Empty when there is no price.
std::string prices_text(const Result& result);

/// Value of "prices": every step of each.
void write_prices(JsonWriter& json, const Result& result);

}  // namespace dropfront::report
