// Small lists and problem files in a folder of their own, removed at the end. All figures are invented.
#pragma once
#include <unistd.h>

#include <atomic>
#include <filesystem>
#include <fstream>
#include <string>

#include "dropfront/problem/problem.hpp"
#include "dropfront/values/input_error.hpp"

namespace dropfront::problem::testing {

inline const char* const kDroppers =
    "part,capacitance,tolerance,rated_voltage,series_rated,class,slew,loss_tangent,price_1,price_1000,length_"
    "mm,"
    "width_mm,height_mm\n"
    "film-220n,220 nF,10 %,275 V,true,X2,150 V/us,0.001,0.20,0.15,18,6,12\n"
    "film-470n,470 nF,10 %,275 V,true,X2,150 V/us,0.001,0.30,0.22,18,8,14\n"
    "film-470n-b,470 nF,20 %,310 V,false,X2,150 V/us,0.001,0.25,0.18,18,8,14\n"
    "film-1u,1 uF,10 %,275 V,true,X2,100 V/us,0.001,0.55,0.40,26,10,18\n";

inline const char* const kResistors =
    "part,resistance,tolerance,rated_power,rated_voltage,construction,pulse_energy,slots,price_1,length_mm,"
    "width_mm,"
    "height_mm\n"
    "fuse-47R,47R,5 %,2 W,350 V,wirewound,3 J,series_resistor,0.05,9,3.5,3.5\n"
    "fuse-100R,100R,5 %,2 W,350 V,wirewound,3 J,series_resistor,0.05,9,3.5,3.5\n"
    "fuse-220R,220R,5 %,2 W,350 V,wirewound,2 J,series_resistor,0.05,9,3.5,3.5\n"
    "chip-220k,220k,5 %,0.25 W,200 V,film,,discharge,0.004,3.2,1.6,0.6\n"
    "chip-470k,470k,5 %,0.25 W,200 V,film,,discharge,0.004,3.2,1.6,0.6\n"
    "any-1k,1k,1 %,0.5 W,250 V,film,,,0.01,6.5,2.5,2.5\n";

inline const char* const kClamps =
    "part,voltage,tolerance,test_current,slope_resistance,rated_power,pulse_power,pulse_time,price_1,length_"
    "mm,"
    "width_mm,height_mm\n"
    "z6v8,6.8 V,5 %,37 mA,3.5 R,1.3 W,60 W,1 ms,0.03,4.2,2.6,2.6\n"
    "z12,12 V,5 %,21 mA,9 R,1.3 W,60 W,1 ms,0.03,4.2,2.6,2.6\n"
    "z24,24 V,5 %,10.5 mA,25 R,1.3 W,60 W,1 ms,0.03,4.2,2.6,2.6\n";

inline const char* const kReservoirs =
    "part,capacitance,tolerance,rated_voltage,surge_voltage,esr,ripple_current,life_hours,life_temperature,"
    "price_1,"
    "length_mm,width_mm,height_mm\n"
    "e100u-35,100 uF,20 %,35 V,40 V,0.5 R,200 mA,5000,105 °C,0.05,6.3,6.3,11\n"
    "e220u-16,220 uF,20 %,16 V,20 V,0.4 R,250 mA,5000,105 °C,0.05,6.3,6.3,11\n"
    "e220u-35,220 uF,20 %,35 V,40 V,0.3 R,300 mA,5000,105 °C,0.08,8,8,11\n"
    "e470u-35,470 uF,20 %,35 V,40 V,0.15 R,500 mA,5000,105 °C,0.12,10,10,16\n";

inline const char* const kRectifiers =
    "part,threshold_voltage,slope_resistance,reverse_voltage,surge_current,price_1,length_mm,width_mm,height_"
    "mm\n"
    "d1000,0.67 V,0.67 R,1000 V,30 A,0.01,4.2,2.6,2.6\n";

inline const char* const kStages =
    "part,kind,output_voltage,tolerance,dropout,quiescent_current,input_max,thermal_resistance,price_1,"
    "length_mm,"
    "width_mm,height_mm\n"
    "lin-3v3,linear,3.3 V,2 %,0.3 V,50 uA,30 V,160 K/W,0.10,3,3,1.5\n"
    "lin-5,linear,5 V,2 %,0.3 V,50 uA,30 V,160 K/W,0.10,3,3,1.5\n"
    "lin-5-coarse,linear,5 V,6 %,1.7 V,3 mA,30 V,160 K/W,0.05,3,3,1.5\n"
    "zener-only-5,direct,5 V,5 %,,,,,0,0,0,0\n";

inline const char* const kProblem = R"({
  "title": "bench", // a comment
  "mains": {"voltage": {"low": "207 V", "nominal": "230 V", "high": "253 V"}, "frequency": "50 Hz"},
  "output": {"voltage": "5 V", "loads": [{"name": "asleep", "current": "0.2 mA"}, {"name": "awake", "current": "8 mA"}]},
  "parts": ["lists"]
})";

/// Stands for ["lists"] in the problem above: every further section and key once.
inline const char* const kEverySection = R"(["lists"],
  "$schema": "x",
  "surroundings": {"ambient": {"low": "-10 °C", "nominal": "25 °C", "high": "60 °C", "mean_over_life": "40 °C"},
                   "enclosure": "12 K/W", "life": "10 years", "pollution_degree": 3, "material_group": "II",
                   "max_height": "25 mm", "ripple_life": "none"},
  "connection": {"kind": "switched", "plug_ins": 5000, "chatter": 3},
  "limits": {"standby_power": "0.5 W", "current_margin": "10 %", "start_time": "1 s",
             "discharge": {"voltage": "34 V", "after": "1 s", "not_below": "50 nF"},
             "surge": {"voltage": "1 kV", "source": "2 R"}, "fast_burst": "1 kV", "dips": [{"residual": "0 %", "cycles": 0.5}],
             "series_rated": true},
  "derating": {"resistor.power": "50 %", "reservoir.voltage": 0.9, "dropper.voltage": "90 %", "clamp.power": "80 %",
               "junction": "20 K"},
  "volume": 10000, "currency": "USD", "placement_cost": 0.004, "missing_ratings": "accept",
  "slots": {"arrangement": ["bridge-clamp-across", "half-wave-clamp-ahead"],
            "output_stage": {"only": "lin-5"},
            "dropper": {"where": {"series_rated": true, "capacitance": {"max": "500 nF"}}, "parallel": 2},
            "series_resistor": {"series": "E12", "from": "22R", "to": "470R", "like": "fuse-100R", "split": 2},
            "clamp": {"except": ["z24"]},
            "reservoir": {"only": ["e220u-35", {"capacitance": "330 uF", "tolerance": 0.2, "rated_voltage": 35}]},
            "discharge": {"count": [1, 2], "optional": true}, "rectifier": {}},
  "objectives": ["standby_loss", "cost"],
  "resolution": {"cost": 0, "standby_loss": "2 mW", "board_area": "1 mm2"},
  "top": 3, "effort": "quick", "seed": 7)";

class Bench {
 public:
  Bench() {
    static std::atomic<int> count{0};
    folder_ = std::filesystem::temp_directory_path() /
              ("dropfront-problem-" + std::to_string(::getpid()) + "-" + std::to_string(count++));
    std::filesystem::create_directories(folder_ / "lists");
    write("lists/droppers.csv", kDroppers);
    write("lists/resistors.csv", kResistors);
    write("lists/clamps.csv", kClamps);
    write("lists/reservoirs.csv", kReservoirs);
    write("lists/rectifiers.csv", kRectifiers);
    write("lists/output_stages.csv", kStages);
  }
  ~Bench() { std::filesystem::remove_all(folder_); }
  Bench(const Bench&) = delete;
  Bench& operator=(const Bench&) = delete;

  std::string path(const std::string& name) const { return (folder_ / name).string(); }
  void write(const std::string& name, const std::string& text) const {
    std::ofstream(folder_ / name, std::ios::binary) << text;
  }

  /// Reads `text` as the file bench.json.
  ProblemFile read(const std::string& text = kProblem, const std::vector<std::string>& sets = {}) const {
    write("bench.json", text);
    return read_problem_file(path("bench.json"), sets);
  }
  Problem problem(const std::vector<std::string>& sets = {}, const std::string& text = kProblem) const {
    return read(text, sets).problems.at(0);
  }
  /// The message a text is refused with, the folder cut off; "accepted" when it is not.
  std::string refusal(const std::string& text, const std::vector<std::string>& sets = {}) const {
    try {
      read(text, sets);
    } catch (const values::InputError& error) {
      const std::string message = error.what(), folder = folder_.string() + "/";
      return message.rfind(folder, 0) == 0 ? message.substr(folder.size()) : message;
    }
    return "accepted";
  }

 private:
  std::filesystem::path folder_;
};

/// `text` with the first `from` replaced by `to`; fails loudly when it is not there.
inline std::string with(std::string text, const std::string& from, const std::string& to) {
  const std::size_t at = text.find(from);
  if (at == std::string::npos) throw std::logic_error("not in the text: " + from);
  return text.replace(at, from.size(), to);
}

template <class Part>
std::vector<std::string> names_of(const std::vector<const Part*>& parts) {
  std::vector<std::string> names;
  for (const Part* part : parts) names.push_back(part ? part->info.name : "none");
  return names;
}

inline const Default* find_default(const Problem& problem, const std::string& key) {
  for (const Default& entry : problem.defaults) {
    if (entry.key == key) return &entry;
  }
  return nullptr;
}

}  // namespace dropfront::problem::testing
