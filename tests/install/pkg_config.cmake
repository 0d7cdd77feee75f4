# Builds the example with the flags that pkg-config gives for the installed package, and runs it.
#   cmake -DPREFIX=.. -DLIBDIR=.. -DWORK=.. -DEXAMPLE=.. -DVERSION=.. -DPKG_CONFIG=.. -DC_COMPILER=.. -DC_FLAGS=.. -P pkg_config.cmake
cmake_minimum_required(VERSION 3.25)
include(${CMAKE_CURRENT_LIST_DIR}/common.cmake)

function(pkg_config out)
    execute_process(
        COMMAND ${CMAKE_COMMAND} -E env --unset=PKG_CONFIG_PATH PKG_CONFIG_LIBDIR=${PREFIX}/${LIBDIR}/pkgconfig
            ${PKG_CONFIG} ${ARGN} rankstead
        OUTPUT_VARIABLE output OUTPUT_STRIP_TRAILING_WHITESPACE COMMAND_ERROR_IS_FATAL ANY)
    set(${out} "${output}" PARENT_SCOPE)
endfunction()

pkg_config(version --modversion)
if(NOT version STREQUAL VERSION)
    message(FATAL_ERROR "pkg-config says version ${version}, not ${VERSION}")
endif()
pkg_config(flags --cflags --libs)
separate_arguments(flags UNIX_COMMAND "${flags}")
separate_arguments(c_flags UNIX_COMMAND "${C_FLAGS}")

file(REMOVE_RECURSE ${WORK})
file(MAKE_DIRECTORY ${WORK})
step(${C_COMPILER} -std=c99 -Wall -Wextra -Wpedantic -Werror ${c_flags} ${EXAMPLE} -o ${WORK}/pairs_example ${flags}
    -Wl,-rpath,${PREFIX}/${LIBDIR})
check_example(${WORK}/pairs_example)
