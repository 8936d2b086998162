#pragma once
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/report/result.hpp"
#include "dropfront/report/study.hpp"

namespace dropfront::report {

/// One file of a result folder: its name and the pure function that makes it.
struct Output {
  std::string_view file;
  std::string (*render)(const Result& result);
};
struct StudyOutput {
  std::string_view file;
  std::string (*render)(const Study& study);
};

/// All files of a result folder and of a study's own folder. Adding an output is one function and one line.
const std::vector<Output>& outputs();
const std::vector<StudyOutput>& study_outputs();

/// A file ready to be written, its path relative to the folder.
struct File {
  std::string path;
  std::string content;
};
std::vector<File> result_files(const Result& result);
/// The study's own files, then the result files of each combination in its folder.
std::vector<File> study_files(const Study& study);

}  // namespace dropfront::report
