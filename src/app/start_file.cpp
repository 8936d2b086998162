#include "dropfront/app/start_file.hpp"

namespace dropfront::app {

std::string_view start_file() {
  return R"(// A problem for dropfront: what the supply must do, what it may be built of, what counts.
// Change the values, delete what you do not need: only title, mains, output and parts are required.
//   dropfront check THIS_FILE     says what it asks, with every default and its reason
//   dropfront search THIS_FILE    finds the candidate sets
// Values are texts with a unit ("470 nF", "4k7", "5 %", "15 ms", "60 °C") or plain SI numbers.
{
  "title": "My supply, 230 V",

  // The mains as it may really be at the socket. A list of named supplies makes one design pass them all.
  "mains": { "voltage": {"low": "207 V", "nominal": "230 V", "high": "253 V"},
             "frequency": {"low": "49.5 Hz", "nominal": "50 Hz", "high": "50.5 Hz"} },

  // Loads at the output are alternative states, each with a name. One of them is the standby state.
  "output": { "voltage": "5 V", "tolerance": "5 %",
              "loads": [ {"name": "asleep", "current": "0.3 mA"},
                         {"name": "awake", "current": "8 mA"} ],
              "standby_load": "asleep", "start_load": "0.3 mA" },

  "surroundings": { "ambient": {"low": "0 °C", "nominal": "25 °C", "high": "50 °C"},
                    "enclosure": "12 K/W",     // rise of the air inside for every watt of input
                    "life": "10 years", "max_height": "25 mm" },

  "connection": { "kind": "plug", "plug_ins": 1000 },   // or "switched", "fixed"

  // A limit that is left out is not checked.
  "limits": { "standby_power": "0.5 W", "current_margin": "10 %",
              "discharge": {"voltage": "34 V", "after": "1 s"} },

  "volume": 10000, "currency": "EUR", "placement_cost": 0.004,

  // Folders of parts lists, relative to this file. The demo lists are invented: use your own for real work.
  "parts": ["parts/demo"],

  // What each slot may take. "where" filters the lists, "only" names parts, "series" makes a family of
  // preferred values like one row. A slot that is left out takes every row.
  "slots": { "arrangement": ["half-wave-clamp-ahead", "bridge-clamp-across"],
             "dropper": {"where": {"series_rated": true}},
             "series_resistor": {"where": {"resistance": {"min": "22R", "max": "470R"}, "fusible": true}},
             "clamp": {"where": {"voltage": {"min": "5.6 V", "max": "30 V"}}},
             "reservoir": {"where": {"capacitance": {"min": "47 uF", "max": "1000 uF"}}},
             "discharge": {"where": {"resistance": {"min": "220k"}}, "count": [2, 3]},
             "rectifier": {"only": ["1N4007"]} },

  "objectives": ["cost", "standby_loss", "board_area", "current_margin"]

  // , "vary": { "output.voltage": ["3.3 V", "5 V"] }   one search for each value
}
)";
}

}  // namespace dropfront::app
