#include "dropfront/report/outputs.hpp"

#include "dropfront/report/candidates_csv.hpp"
#include "dropfront/report/candidates_json.hpp"
#include "dropfront/report/summary_text.hpp"

namespace dropfront::report {

const std::vector<Output>& outputs() {
  static const std::vector<Output> table{
      {"candidates.json", candidates_json},
      {"candidates.csv", candidates_csv},
      {"bom.csv", bom_csv},
      {"summary.txt", summary_text},
  };
  return table;
}

const std::vector<StudyOutput>& study_outputs() {
  static const std::vector<StudyOutput> table{
      {"study.json", study_json},
      {"study.csv", study_csv},
      {"summary.txt", study_text},
  };
  return table;
}

std::vector<File> result_files(const Result& result) {
  std::vector<File> files;
  for (const auto& output : outputs()) files.push_back({std::string(output.file), output.render(result)});
  return files;
}

std::vector<File> study_files(const Study& study) {
  std::vector<File> files;
  for (const auto& output : study_outputs())
    files.push_back({std::string(output.file), output.render(study)});
  for (const auto& combination : study.combinations) {
    if (!combination.result) continue;
    for (auto& file : result_files(*combination.result))
      files.push_back({combination.folder + '/' + file.path, std::move(file.content)});
  }
  return files;
}

}  // namespace dropfront::report
