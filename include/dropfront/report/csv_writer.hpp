#pragma once
#include <initializer_list>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace dropfront::report {

/// Lines of comma-separated values (RFC 4180 quoting, line feeds). Absent numbers are empty cells.
class CsvWriter {
 public:
  explicit CsvWriter(const std::vector<std::string>& header);
  CsvWriter& cell(std::string_view text);
  CsvWriter& cell(double number);
  CsvWriter& cell(const std::optional<double>& number);
  void end_row();
  std::string take() { return std::move(text_); }

 private:
  std::string text_;
  bool row_empty_ = true;
};

}  // namespace dropfront::report
