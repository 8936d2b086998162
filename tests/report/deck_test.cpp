#include "dropfront/report/deck.hpp"

#include <limits>
#include <sstream>

#include "support/catch.hpp"

namespace dropfront::report {
namespace {

using circuit::Network;
using circuit::Node;
using circuit::Owner;

/// One element of each kind, so that every kind shows in the deck.
Network one_of_each() {
  Network n;
  const Node line = n.add_node(), middle = n.add_node(), rail = n.add_node();
  n.source = {line, circuit::Waveform(230, 50, {{3, 0.03, 0.5}})};
  n.resistors.push_back({line, middle, 47, Owner::series_resistor});
  n.resistors.push_back({middle, rail, std::numeric_limits<double>::infinity(), Owner::discharge});
  n.capacitors.push_back({middle, rail, 0.47e-6, Owner::dropper});
  n.capacitors.push_back({rail, 0, 220e-6, Owner::reservoir});
  n.branches.push_back({rail, 0, 12, 9, Owner::clamp});
  n.branches.push_back({0, rail, 0.67, 0.67, Owner::rectifier});
  n.loads.push_back({rail, 0, 5e-3, 4});
  n.rail = rail;
  return n;
}

std::vector<std::string> lines_of(const std::string& deck) {
  std::vector<std::string> lines;
  std::istringstream in(deck);
  for (std::string line; std::getline(in, line);) lines.push_back(line);
  return lines;
}

bool holds(const std::string& deck, const std::string& part) { return deck.find(part) != std::string::npos; }

TEST_CASE("a deck begins with its title, ends with .end and warns of mains potential") {
  const std::string deck = make_deck(one_of_each(), "stairwell lamp");
  const auto lines = lines_of(deck);
  CHECK(lines.front() == "stairwell lamp");
  CHECK(lines.back() == ".end");
  CHECK(holds(deck, "at mains potential"));
  CHECK(holds(deck, "calculation, not an approval"));
}

TEST_CASE("a title or note cannot smuggle in a line of its own") {
  DeckOptions options;
  options.notes = {"corner\n.end"};
  for (const std::string& line : lines_of(make_deck(one_of_each(), "two\n.end", options))) {
    if (line == ".end") continue;
    CHECK(line.find(".end") != 0);
  }
  CHECK(lines_of(make_deck(one_of_each(), "two\nlines")).front() == "two lines");
}

TEST_CASE("every element stands in the deck under its owner, an infinite resistor does not") {
  const std::string deck = make_deck(one_of_each(), "t");
  for (const char* owner : {"* series resistor\nR1 n1 n2 47\n", "* dropper\nC1 n2 n3 4.7e-07 IC=0\n",
                            "* reservoir\nC2 n3 0 0.00022 IC=0\n", "* clamp: 12 V, 9 ohm\n", "* rectifier: "})
    CHECK(holds(deck, owner));
  CHECK_FALSE(holds(deck, "R2 "));
  CHECK_FALSE(holds(deck, "inf"));
}

TEST_CASE("tones are sources in series from the neutral to the line") {
  const std::string deck = make_deck(one_of_each(), "t");
  CHECK(holds(deck, "\nVM1 mains1 0 SIN(0 "));
  CHECK(holds(deck, "\nVM2 n1 mains1 SIN(0 "));
}

TEST_CASE("the start state reaches the capacitors in the network's order") {
  DeckOptions options;
  options.initial_V = {-300.5, 11.25};
  const std::string deck = make_deck(one_of_each(), "t", options);
  CHECK(holds(deck, "C1 n2 n3 4.7e-07 IC=-300.5\n"));
  CHECK(holds(deck, "C2 n3 0 0.00022 IC=11.25\n"));
}

TEST_CASE("the piecewise form writes the exact curve and no junction") {
  DeckOptions options;
  options.branches = BranchForm::piecewise;
  const std::string deck = make_deck(one_of_each(), "t", options);
  CHECK(holds(deck, "B1 n3 0 I=uramp(V(n3)-(12))/9\n"));
  CHECK_FALSE(holds(deck, ".model"));
}

TEST_CASE("a paired branch is two diodes that share its threshold and slope") {
  Network n = one_of_each();
  n.branches.push_back({1, 3, 1.5, 2, Owner::rectifier, 2, 0});
  DeckOptions options;
  options.branches = BranchForm::piecewise;
  const std::string deck = make_deck(n, "t", options);
  CHECK(holds(deck, "B3 n1 n3 I=uramp(V(n1,n3)-(0.75))/1\n"));
  CHECK(holds(deck, "B3b n2 0 I=uramp(V(n2)-(0.75))/1\n"));
}

TEST_CASE("the same network gives the same deck") {
  CHECK(make_deck(one_of_each(), "t") == make_deck(one_of_each(), "t"));
}

}  // namespace
}  // namespace dropfront::report
