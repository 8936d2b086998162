#pragma once
#include <cstdint>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/app/console.hpp"
#include "dropfront/app/exit_status.hpp"

namespace dropfront::app {

/// One plain struct and one function a command. Input errors are thrown as values::InputError, a refusing
/// disk as report::DiskFault; `run` turns them into messages and exit statuses.
struct SearchArguments {
  std::vector<std::string> problems;
  std::string out = "results";
  bool prove = false;                 ///< prove the fronts, whatever the size
  std::optional<std::string> effort;  ///< quick, normal, deep; unset: as the problem says
  std::optional<int> top;
  std::optional<std::uint64_t> seed;
  int threads = 0;                     ///< 0: all cores
  std::optional<std::int64_t> budget;  ///< designs looked at, each search
  std::optional<std::string> time;     ///< "30 s", each search
  std::vector<std::string> sets;
  bool json = false;
  bool quiet = false;
};
ExitStatus search_command(const SearchArguments& arguments, Console& console);

struct AssessArguments {
  std::string problem;
  std::string design;
  std::optional<int> combination;  ///< of a study, from 1
  std::vector<std::string> sets;
  bool explain = false;
  bool json = false;
};
ExitStatus assess_command(const AssessArguments& arguments, Console& console);

struct CheckArguments {
  std::vector<std::string> problems;
  std::vector<std::string> sets;
};
ExitStatus check_command(const CheckArguments& arguments, Console& console);

struct PartsArguments {
  std::string problem;
  std::optional<std::string> slot;
  std::vector<std::string> sets;
};
ExitStatus parts_command(const PartsArguments& arguments, Console& console);

struct DeckArguments {
  std::string result;
  int candidate = 1;
  std::string corner = "nominal";
  std::optional<std::string> supply;  ///< of several, by name; unset: the first
};
ExitStatus deck_command(const DeckArguments& arguments, Console& console);

struct SeriesArguments {
  std::string value;
  std::string series = "E24";
};
ExitStatus series_command(const SeriesArguments& arguments, Console& console);

struct StartArguments {
  std::optional<std::string> file;  ///< unset: standard output
};
ExitStatus start_command(const StartArguments& arguments, Console& console);

}  // namespace dropfront::app
