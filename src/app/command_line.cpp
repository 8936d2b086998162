#include "dropfront/app/command_line.hpp"

#include <fmt/core.h>

#include <CLI/CLI.hpp>
#include <algorithm>

#include "dropfront/app/commands.hpp"
#include "dropfront/report/folder_writer.hpp"
#include "dropfront/values/input_error.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::app {

namespace {

/// All arguments of all commands; the command that was named fills and reads its own.
struct Arguments {
  SearchArguments search;
  AssessArguments assess;
  CheckArguments check;
  PartsArguments parts;
  DeckArguments deck;
  SeriesArguments series;
  StartArguments start;
};

constexpr const char* kAbout =
    "Searches parts lists for capacitor-dropper supplies: cheapest, least standby loss, smallest, most "
    "margin.\n"
    "Such a supply is not isolated: every node is at mains potential. A result is a calculation, not an "
    "approval.";

void add_sets(CLI::App* command, std::vector<std::string>& sets) {
  command
      ->add_option("--set", sets,
                   "Change a value of the problem: key=value, e.g. limits.standby_power=\"0.3 W\"")
      ->allow_extra_args(false)
      ->type_name("KEY=VALUE");
}

CLI::App* add_search(CLI::App& app, SearchArguments& a) {
  CLI::App* command = app.add_subcommand("search", "Find the candidate sets of one or more problems");
  command->add_option("problem", a.problems, "Problem files")->required()->type_name("PROBLEM");
  command->add_option("--out", a.out, "Folder of the result folders")
      ->capture_default_str()
      ->type_name("DIR");
  command->add_flag("--prove", a.prove,
                    "Go on until nothing in the lists can do better (small problems: always)");
  command->add_option("--effort", a.effort, "quick, normal or deep (default: as the problem says)")
      ->check(CLI::IsMember({"quick", "normal", "deep"}))
      ->type_name("EFFORT");
  command->add_option("--top", a.top, "Designs in each ranked set")
      ->check(CLI::Range(1, 1000))
      ->type_name("N");
  command->add_option("--seed", a.seed, "Seed of the random stream")->type_name("N");
  command->add_option("--threads", a.threads, "Threads (default: all cores); never changes the answer")
      ->check(CLI::Range(1, 1024))
      ->type_name("N");
  command->add_option("--budget", a.budget, "Most designs looked at in each search")
      ->check(CLI::Range(std::int64_t{1}, std::int64_t{1000000000000}))
      ->type_name("N");
  command
      ->add_option("--time", a.time,
                   "Most time for each search, e.g. \"30 s\"; the answer then depends on it")
      ->type_name("TIME");
  add_sets(command, a.sets);
  command->add_flag("--json", a.json, "Print one JSON document and nothing else");
  command->add_flag("--quiet", a.quiet, "Print only where the files are");
  command->footer("Example:\n  dropfront search problems/towel-rail-timer.json --out results --effort quick");
  return command;
}

CLI::App* add_assess(CLI::App& app, AssessArguments& a) {
  CLI::App* command = app.add_subcommand("assess", "Score one given design against a problem");
  command->add_option("problem", a.problem, "Problem file")->required()->type_name("PROBLEM");
  command->add_option("--design", a.design, "Design file: part names, or numbers inline")
      ->required()
      ->type_name("FILE");
  command->add_option("--combination", a.combination, "Which problem of a study, from 1")->type_name("N");
  add_sets(command, a.sets);
  command->add_flag("--explain", a.explain, "Say where each check was worst and what it rests on");
  command->add_flag("--json", a.json, "Print one JSON document and nothing else");
  command->footer(
      "Example:\n  dropfront assess problems/leak-alarm.json --design problems/designs/bench-120v.json "
      "--explain");
  return command;
}

CLI::App* add_check(CLI::App& app, CheckArguments& a) {
  CLI::App* command =
      app.add_subcommand("check", "Say what problems ask, with every default, without searching");
  command->add_option("problem", a.problems, "Problem files")->required()->type_name("PROBLEM");
  add_sets(command, a.sets);
  command->footer("Example:\n  dropfront check problems/leak-alarm.json");
  return command;
}

CLI::App* add_parts(CLI::App& app, PartsArguments& a) {
  CLI::App* command = app.add_subcommand("parts", "Say what each slot of a problem offers");
  command->add_option("problem", a.problem, "Problem file")->required()->type_name("PROBLEM");
  command->add_option("--slot", a.slot, "List every part of one slot")->type_name("SLOT");
  add_sets(command, a.sets);
  command->footer("Example:\n  dropfront parts problems/leak-alarm.json --slot clamp");
  return command;
}

CLI::App* add_deck(CLI::App& app, DeckArguments& a) {
  CLI::App* command =
      app.add_subcommand("deck", "Circuit-simulator deck (SPICE3 syntax) of a candidate, runnable as is");
  command->add_option("result", a.result, "Result folder")->required()->type_name("RESULT");
  command->add_option("--candidate", a.candidate, "Number of the candidate")->required()->type_name("N");
  command
      ->add_option("--corner", a.corner,
                   "nominal, lean_cold, lean_hot, rich_empty, rich_loaded, standby or standby_worst")
      ->capture_default_str()
      ->type_name("CORNER");
  command->add_option("--supply", a.supply, "Which of several supplies (default: the first)")
      ->type_name("NAME");
  command->footer("Example:\n  dropfront deck results/towel-rail-timer --candidate 1 --corner lean_cold");
  return command;
}

CLI::App* add_series(CLI::App& app, SeriesArguments& a) {
  CLI::App* command = app.add_subcommand("series", "Preferred values around a value (IEC 60063)");
  command->add_option("value", a.value, "A value: 4.7k, 470n, R47, 52")->required()->type_name("VALUE");
  command->add_option("--in", a.series, "E3, E6, E12, E24, E48, E96 or E192")
      ->capture_default_str()
      ->type_name("SERIES");
  command->footer("Example:\n  dropfront series 430n --in E12");
  return command;
}

CLI::App* add_start(CLI::App& app, StartArguments& a) {
  CLI::App* command = app.add_subcommand("start", "Write a commented problem file to begin from");
  command->add_option("file", a.file, "New file (default: standard output)")->type_name("FILE");
  command->footer("Example:\n  dropfront start problems/my-supply.json");
  return command;
}

void refuse_unknown_command(const CLI::App& app, int argc, const char* const* argv) {
  if (argc < 2) throw values::InputError("dropfront", "", "no command given; dropfront --help lists them");
  if (*argv[1] == '-' || *argv[1] == '\0') return;
  std::vector<std::string> known;
  for (const CLI::App* one : app.get_subcommands({})) known.push_back(one->get_name());
  if (std::find(known.begin(), known.end(), argv[1]) != known.end()) return;
  throw values::InputError("dropfront", "",
                           "no command '" + std::string(argv[1]) + "'" +
                               values::did_you_mean(argv[1], known) + "; dropfront --help lists them");
}

ExitStatus command(int argc, const char* const* argv, Console& console) {
  CLI::App app{kAbout, "dropfront"};
  app.require_subcommand(1);
  app.set_version_flag("--version", "dropfront " DROPFRONT_VERSION);
  app.footer("dropfront COMMAND --help shows an example.");
  app.failure_message([](const CLI::App*, const CLI::Error& error) {
    return fmt::format("error: {}; dropfront COMMAND --help shows how it is used\n", error.what());
  });
  Arguments all;
  CLI::App* search = add_search(app, all.search);
  CLI::App* assess = add_assess(app, all.assess);
  CLI::App* check = add_check(app, all.check);
  CLI::App* parts = add_parts(app, all.parts);
  CLI::App* deck = add_deck(app, all.deck);
  CLI::App* series = add_series(app, all.series);
  CLI::App* start = add_start(app, all.start);
  refuse_unknown_command(app, argc, argv);
  try {
    app.parse(argc, argv);
  } catch (const CLI::ParseError& error) {
    return app.exit(error, console.out, console.err) == 0 ? ExitStatus::done : ExitStatus::bad_input;
  }
  if (*search) return search_command(all.search, console);
  if (*assess) return assess_command(all.assess, console);
  if (*check) return check_command(all.check, console);
  if (*parts) return parts_command(all.parts, console);
  if (*deck) return deck_command(all.deck, console);
  if (*series) return series_command(all.series, console);
  if (*start) return start_command(all.start, console);
  return ExitStatus::bad_input;
}

}  // namespace

ExitStatus run(int argc, const char* const* argv, Console& console) {
  try {
    const ExitStatus status = command(argc, argv, console);
    console.out.flush();
    if (console.out) return status;
    console.err << "error: standard output could not be written\n";
  } catch (const values::InputError& error) {
    console.err << "error: " << error.what() << '\n';
    return ExitStatus::bad_input;
  } catch (const report::DiskFault& error) {
    console.err << "error: " << error.what() << '\n';
  } catch (const std::exception& error) {
    console.err << "internal fault: " << error.what() << '\n';
  }
  return ExitStatus::fault;
}

}  // namespace dropfront::app
