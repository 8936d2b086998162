#include "dropfront/report/design_json.hpp"

#include <unistd.h>

#include <filesystem>
#include <fstream>

#include "dropfront/report/design_slots.hpp"
#include "dropfront/report/score_json.hpp"
#include "report/sample.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

std::string design_text(const scoring::Design& design) {
  JsonWriter json;
  write_design(json, design);
  return json.take();
}

/// Writes `text` to a file of its own, reads it as a design, removes the file.
scoring::Design read_back(const std::string& text, problem::Problem& problem) {
  const auto path =
      std::filesystem::temp_directory_path() / ("design_" + std::to_string(::getpid()) + ".json");
  std::ofstream(path, std::ios::binary) << text;
  const auto design = problem::read_design_file(path.string(), problem);
  std::filesystem::remove(path);
  return design;
}

struct Named {
  const char* problem;
  const char* design;
};
constexpr Named kSamples[] = {{"leak-alarm", "bench-120v"},
                              {"leak-alarm", "leak-alarm-bridge"},
                              {"towel-rail-timer", "towel-rail-timer"}};

TEST_CASE("a design written with its numbers inline reads back the same to the bit") {
  for (const auto& [problem, design] : kSamples) {
    INFO(design);
    auto s = sample(problem, design);
    const std::string text = design_text(s.design);
    const auto again = read_back(text, s.file.problems.front());
    CHECK(design_text(again) == text);
    const auto before = design_slots(s.design), after = design_slots(again);
    REQUIRE(before.size() == after.size());
    for (std::size_t i = 0; i < before.size(); ++i) {
      INFO(before[i].slot);
      CHECK(before[i].electrical == after[i].electrical);
      CHECK(before[i].counted == after[i].counted);
      CHECK(common_columns(*before[i].info) == common_columns(*after[i].info));
    }
    CHECK(again.arrangement == s.design.arrangement);
  }
}

TEST_CASE("a varistor with its side, and a fuse, read back the same") {
  for (const bool before : {true, false}) {
    auto s = sample("towel-rail-timer", "towel-rail-timer");
    const auto& lists = *s.problem().catalogue;
    for (const auto& part : lists.varistors)
      if (part.continuous_voltage_Vrms == 275) s.design.varistor = &part;
    s.design.fuse = &lists.fuses.front();
    s.design.varistor_before = before;
    REQUIRE(s.design.varistor != nullptr);
    const std::string text = design_text(s.design);
    const auto again = read_back(text, s.file.problems.front());
    CHECK(again.varistor_before == before);
    REQUIRE(again.varistor != nullptr);
    REQUIRE(again.fuse != nullptr);
    CHECK(again.fuse->melting_i2t_A2s == s.design.fuse->melting_i2t_A2s);
    CHECK(design_text(again) == text);
  }
}

TEST_CASE("a design read back scores the same, figure for figure") {
  for (const auto& [problem, design] : kSamples) {
    INFO(design);
    auto s = sample(problem, design);
    const auto again = read_back(design_text(s.design), s.file.problems.front());
    const auto& need = s.problem().requirement;
    const auto document = [&need](const scoring::Design& d) {
      return score_document(d, need, scoring::score(d, need, scoring::Depth::full));
    };
    CHECK(document(s.design) == document(again));
  }
}

TEST_CASE("a missing rating stays missing") {
  auto s = sample("leak-alarm", "leak-alarm-bridge");
  parts::Clamp bare = *s.design.clamp;
  bare.pulse_power_W.reset();
  s.design.clamp = &bare;
  const auto again = read_back(design_text(s.design), s.file.problems.front());
  CHECK_FALSE(again.clamp->pulse_power_W);
}

TEST_CASE("parallel droppers and a split series resistor keep their counts, in the file and on the bill") {
  auto s = sample("leak-alarm", "leak-alarm-bridge");
  s.design.dropper_count = 2;
  s.design.series_resistor_count = 3;
  const auto again = read_back(design_text(s.design), s.file.problems.front());
  CHECK(again.dropper_count == 2);
  CHECK(again.series_resistor_count == 3);
  for (const auto& part : design_slots(s.design)) {
    if (part.slot == "dropper") CHECK((part.placed == 2 && part.value.starts_with("2 x ")));
    if (part.slot == "series_resistor") CHECK((part.placed == 3 && part.value.starts_with("3 x ")));
  }
}

TEST_CASE("pieces follow the arrangement, elements the chain") {
  const auto bridge = sample("leak-alarm", "leak-alarm-bridge");
  const auto timer = sample("towel-rail-timer", "towel-rail-timer");
  for (const auto& part : design_slots(bridge.design)) {
    if (part.slot == "rectifier") CHECK(part.placed == 4);  // a bridge has four diodes
    if (part.slot == "clamp") CHECK(part.placed == 1);
  }
  for (const auto& part : design_slots(timer.design))
    if (part.slot == "discharge") {
      CHECK(part.counted == 2);
      CHECK(part.placed == 2);
      CHECK(part.value == "2 x 330 kohm");
    }
}

}  // namespace
}  // namespace dropfront::report
