#include "dropfront/report/folder_writer.hpp"

#include <fcntl.h>
#include <signal.h>
#include <unistd.h>

#include <cerrno>
#include <charconv>
#include <cstdio>
#include <cstring>
#include <string>

namespace dropfront::report {

namespace fs = std::filesystem;

namespace {

constexpr std::string_view kFresh = ".partial";    // being written
constexpr std::string_view kPrevious = ".before";  // moved out of the way, where names cannot be exchanged

[[noreturn]] void refuse(const fs::path& path, const char* doing) {
  throw DiskFault(path.string() + ": " + doing + " failed: " + std::strerror(errno));
}

void sync_path(const fs::path& path) {
  const int descriptor = ::open(path.c_str(), O_RDONLY | O_CLOEXEC);
  if (descriptor < 0) refuse(path, "opening");
  const bool fine = ::fsync(descriptor) == 0;
  ::close(descriptor);
  if (!fine) refuse(path, "syncing");
}

void write_file(const fs::path& path, const std::string& content) {
  const int descriptor = ::open(path.c_str(), O_WRONLY | O_CREAT | O_EXCL | O_CLOEXEC, 0666);
  if (descriptor < 0) refuse(path, "creating");
  const char* at = content.data();
  std::size_t left = content.size();
  bool fine = true;
  while (fine && left > 0) {
    const ssize_t written = ::write(descriptor, at, left);
    if (written < 0 && errno == EINTR) continue;
    fine = written > 0;
    at += fine ? written : 0;
    left -= fine ? static_cast<std::size_t>(written) : 0;
  }
  fine = fine && ::fsync(descriptor) == 0;
  const int reason = errno;
  ::close(descriptor);
  errno = reason;
  if (!fine) refuse(path, "writing");
}

/// ".<name>." in front of the process id and one of the suffixes.
std::string hidden_prefix(const fs::path& folder) { return '.' + folder.filename().string() + '.'; }

fs::path hidden_sibling(const fs::path& folder, std::string_view suffix) {
  std::string name = hidden_prefix(folder) + std::to_string(::getpid());
  name += suffix;
  return folder.parent_path() / name;
}

/// A hidden sibling of a process that no longer runs (or of this one).
bool is_leftover(const std::string& file_name, const std::string& prefix) {
  if (!file_name.starts_with(prefix)) return false;
  const char* first = file_name.data() + prefix.size();
  const char* last = file_name.data() + file_name.size();
  pid_t process = 0;
  const auto parsed = std::from_chars(first, last, process);
  if (parsed.ec != std::errc() || process <= 0) return false;
  const std::string_view suffix(parsed.ptr, static_cast<std::size_t>(last - parsed.ptr));
  if (suffix != kFresh && suffix != kPrevious) return false;
  return process == ::getpid() || (::kill(process, 0) != 0 && errno == ESRCH);
}

void remove_leftovers(const fs::path& folder) {
  std::vector<fs::path> leftovers;
  for (const auto& entry : fs::directory_iterator(folder.parent_path()))
    if (is_leftover(entry.path().filename().string(), hidden_prefix(folder)))
      leftovers.push_back(entry.path());
  for (const auto& path : leftovers) fs::remove_all(path);
}

/// Writes and syncs all files under `fresh`, which is made here.
void fill(const fs::path& fresh, const std::vector<File>& files) {
  fs::create_directory(fresh);
  std::vector<fs::path> folders{fresh};
  for (const auto& file : files) {
    const fs::path path = fresh / file.path;
    if (fs::create_directories(path.parent_path())) folders.push_back(path.parent_path());
    write_file(path, file.content);
  }
  for (auto made = folders.rbegin(); made != folders.rend(); ++made) sync_path(*made);
}

/// Puts `fresh` where `folder` is. One step where the file system can exchange two names.
void exchange(const fs::path& fresh, const fs::path& folder) {
  if (::rename(fresh.c_str(), folder.c_str()) == 0) return;  // nothing there, or an empty folder
  if (::renameat2(AT_FDCWD, fresh.c_str(), AT_FDCWD, folder.c_str(), RENAME_EXCHANGE) == 0) return;
  if (errno != EINVAL && errno != ENOSYS) refuse(folder, "replacing");
  const fs::path old = hidden_sibling(folder, kPrevious);
  if (::rename(folder.c_str(), old.c_str()) != 0) refuse(folder, "moving");
  if (::rename(fresh.c_str(), folder.c_str()) != 0) refuse(folder, "replacing");
  fs::remove_all(old);
}

}  // namespace

Place place_at(const fs::path& folder) {
  std::error_code ignored;
  if (!fs::exists(fs::symlink_status(folder, ignored))) return Place::free;
  if (!fs::is_directory(folder, ignored)) return Place::foreign;
  if (fs::exists(folder / "candidates.json", ignored) || fs::exists(folder / "study.json", ignored))
    return Place::result;
  return fs::is_empty(folder, ignored) ? Place::free : Place::foreign;
}

void write_folder(const fs::path& where, const std::vector<File>& files) {
  if (place_at(where) == Place::foreign)
    throw DiskFault(where.string() + ": something other than a result folder stands there");
  const fs::path folder = where.has_parent_path() ? where : "." / where;
  const fs::path fresh = hidden_sibling(folder, kFresh);
  const auto tidy = [&fresh] {
    std::error_code ignored;
    fs::remove_all(fresh, ignored);
  };
  try {
    fs::create_directories(folder.parent_path());
    remove_leftovers(folder);
    fill(fresh, files);
    exchange(fresh, folder);
    sync_path(folder.parent_path());
    fs::remove_all(fresh);  // after an exchange: what stood there before
  } catch (const fs::filesystem_error& error) {
    tidy();
    throw DiskFault(error.what());
  } catch (const DiskFault&) {
    tidy();
    throw;
  }
}

}  // namespace dropfront::report
