#pragma once
#include <filesystem>
#include <stdexcept>
#include <vector>

#include "dropfront/report/outputs.hpp"

namespace dropfront::report {

/// The disk refused: exit status 3. The message names the path and the system's reason.
class DiskFault : public std::runtime_error {
 public:
  using std::runtime_error::runtime_error;
};

/// What stands where a result folder is to go.
enum class Place {
  free,    ///< nothing, or an empty folder
  result,  ///< a result folder (it holds candidates.json or study.json): may be replaced
  foreign  ///< something else: never touched
};
Place place_at(const std::filesystem::path& folder);

/// Writes `files` as the whole content of `folder`: into a hidden folder beside it, synced, then exchanged in
/// one step with what stood there, which is removed. A reader sees the old folder or the new one, never a
/// mixture. Leftovers of killed runs beside `folder` are removed. Throws DiskFault; never replaces a foreign
/// folder.
void write_folder(const std::filesystem::path& folder, const std::vector<File>& files);

}  // namespace dropfront::report
