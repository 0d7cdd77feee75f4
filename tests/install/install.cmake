# Installs the build into an empty private prefix.
#   cmake -DBUILD=.. -DPREFIX=.. -DCONFIG=.. -P install.cmake
cmake_minimum_required(VERSION 3.25)
include(${CMAKE_CURRENT_LIST_DIR}/common.cmake)

file(REMOVE_RECURSE ${PREFIX})
step(${CMAKE_COMMAND} --install ${BUILD} --prefix ${PREFIX} --config ${CONFIG})
