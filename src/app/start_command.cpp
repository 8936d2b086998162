#include <cerrno>
#include <cstring>
#include <fstream>
#include <ostream>

#include "dropfront/app/commands.hpp"
#include "dropfront/app/start_file.hpp"
#include "dropfront/report/folder_writer.hpp"
#include "dropfront/values/input_error.hpp"

namespace dropfront::app {

ExitStatus start_command(const StartArguments& arguments, Console& console) {
  if (!arguments.file) {
    console.out << start_file();
    return ExitStatus::done;
  }
  const std::string& path = *arguments.file;
  if (std::filesystem::exists(std::filesystem::symlink_status(path)))
    throw values::InputError(path, "", "already exists and is left as it is; give the name of a new file");
  std::ofstream file(path, std::ios::binary);
  file << start_file();
  file.close();
  if (!file) throw report::DiskFault(path + ": writing failed: " + std::strerror(errno));
  console.out << "Wrote " << path << ". Next: dropfront check " << path << '\n';
  return ExitStatus::done;
}

}  // namespace dropfront::app
