#include "dropfront/parts/catalogue.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <filesystem>
#include <map>

#include "dropfront/parts/columns.hpp"
#include "dropfront/parts/csv.hpp"
#include "dropfront/parts/field_source.hpp"
#include "dropfront/parts/part_columns.hpp"
#include "dropfront/values/suggest.hpp"
#include "dropfront/values/text_file.hpp"

namespace dropfront::parts {
namespace {

namespace fs = std::filesystem;

/// Faults of the header are told once, at the header.
void check_header(const CsvRow& header, Kind kind, const std::string& file) {
  const std::vector<std::string> known = column_names(kind);
  for (std::size_t i = 0; i < header.size(); ++i) {
    const CsvCell& head = header[i];
    const auto refuse = [&](const std::string& message) {
      throw values::InputError(file, fmt::format("{}:{}", head.line, head.column), message);
    };
    if (head.text.find(';') != std::string::npos) {
      refuse("the header holds a semicolon: cells are separated by commas");
    }
    if (std::find(known.begin(), known.end(), head.text) == known.end()) {
      refuse(fmt::format("{} has no column '{}'{}", kind_with_article(kind), head.text,
                         values::did_you_mean(head.text, known)));
    }
    const auto same = [&](const CsvCell& other) { return other.text == head.text; };
    if (std::any_of(header.begin(), header.begin() + static_cast<std::ptrdiff_t>(i), same)) {
      refuse(fmt::format("column '{}' stands twice in the header", head.text));
    }
  }
}

/// Appends the rows of one list. `read` is the kind's reader.
template <class T>
void append_list(const std::string& folder, Kind kind, T (*read)(const FieldSource&, bool),
                 std::vector<T>& parts) {
  const std::string file = folder + "/" + std::string(list_file_name(kind));
  if (!fs::exists(file)) return;
  const std::vector<CsvRow> rows = parse_csv(values::read_text_file(file), file);
  if (rows.empty())
    throw values::InputError(file, "1:1", "the list is empty, a row of column names is wanted");
  check_header(rows.front(), kind, file);
  std::map<std::string, std::string> places;
  for (const T& part : parts) places.emplace(part.info.name, "another folder");
  parts.reserve(parts.size() + rows.size() - 1);
  for (std::size_t i = 1; i < rows.size(); ++i) {
    const CsvPart row(file, rows.front(), rows[i]);
    T part = read(row, false);
    const auto known = places.emplace(part.info.name, fmt::format("line {}", rows[i].front().line));
    if (!known.second) {
      throw row.error("part", fmt::format("part '{}' stands already in {}, names are unique within a kind",
                                          part.info.name, known.first->second));
    }
    parts.push_back(std::move(part));
  }
}

/// A list under a slightly wrong name would be passed over in silence.
void check_folder(const std::string& folder) {
  std::error_code code;
  if (!fs::is_directory(folder, code)) {
    throw values::InputError(folder, "", "there is no such folder of parts lists");
  }
  std::vector<std::string> known;
  for (const Kind kind : all_kinds) known.emplace_back(list_file_name(kind));
  std::vector<std::string> found;
  for (const auto& entry : fs::directory_iterator(folder)) {
    if (entry.path().extension() == ".csv") found.push_back(entry.path().filename().string());
  }
  std::sort(found.begin(), found.end());
  std::string allowed;
  for (const std::string& name : known) allowed += (allowed.empty() ? "" : ", ") + name;
  if (found.empty()) {
    throw values::InputError(folder, "", "the folder holds no parts list, allowed are " + allowed);
  }
  for (const std::string& name : found) {
    if (std::find(known.begin(), known.end(), name) != known.end()) continue;
    throw values::InputError(
        folder + "/" + name, "",
        "is no known parts list, allowed are " + allowed + values::did_you_mean(name, known));
  }
}

}  // namespace

void read_parts_folder(const std::string& folder, Catalogue& catalogue) {
  check_folder(folder);
  append_list(folder, Kind::dropper, read_dropper, catalogue.droppers);
  append_list(folder, Kind::resistor, read_resistor, catalogue.resistors);
  append_list(folder, Kind::clamp, read_clamp, catalogue.clamps);
  append_list(folder, Kind::reservoir, read_reservoir, catalogue.reservoirs);
  append_list(folder, Kind::rectifier, read_rectifier, catalogue.rectifiers);
  append_list(folder, Kind::output_stage, read_output_stage, catalogue.output_stages);
  append_list(folder, Kind::varistor, read_varistor, catalogue.varistors);
  append_list(folder, Kind::fuse, read_fuse, catalogue.fuses);
  append_list(folder, Kind::thyristor, read_thyristor, catalogue.thyristors);
  append_list(folder, Kind::ceramic, read_ceramic, catalogue.ceramics);
}

}  // namespace dropfront::parts
