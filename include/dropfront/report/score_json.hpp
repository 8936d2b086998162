#pragma once
#include <functional>

#include "dropfront/report/json_writer.hpp"
#include "dropfront/scoring/score.hpp"

namespace dropfront::report {

/// The assess document: design, verdict, objectives, current_margin_new_A (zero_year and horizon_years beside
/// it), operation, checks, cautions. `operation` is {corner: {...}} with one supply, {supply: {corner:
/// {...}}} with several. `more` may add members of its own at the end.
void write_score(JsonWriter& json, const scoring::Design& design, const scoring::Requirement& requirement,
                 const scoring::Score& score, const std::function<void(JsonWriter&)>& more = {});

/// The document by itself, ended by a line break.
std::string score_document(const scoring::Design& design, const scoring::Requirement& requirement,
                           const scoring::Score& score);

/// ["...", ...], one a line.
void write_texts(JsonWriter& json, const std::vector<std::string>& texts);

/// R.m.s. mains voltage of a named corner: low for lean, high for rich, else nominal.
double corner_voltage_Vrms(const scoring::Supply& supply, std::string_view corner);

}  // namespace dropfront::report
