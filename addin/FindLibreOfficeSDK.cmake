# Finds the LibreOffice SDK and the office it belongs to.
#
# Set LIBREOFFICE_SDK_DIR (the folder that holds include/ and bin/) and LIBREOFFICE_PROGRAM_DIR (the folder that holds
# soffice.bin and types.rdb) to override what is found.
#
# Defines LibreOfficeSDK_UNOIDL_WRITE, LibreOfficeSDK_CPPUMAKER, LibreOfficeSDK_TYPES (the type libraries of the office)
# and the target LibreOfficeSDK::cppu: the SDK's own headers, the platform macros they need, the three UNO libraries.

find_path(LIBREOFFICE_SDK_DIR NAMES include/sal/types.h
    PATHS /usr/lib/libreoffice/sdk /usr/lib64/libreoffice/sdk /opt/libreoffice/sdk
    DOC "The LibreOffice SDK")
find_path(LIBREOFFICE_PROGRAM_DIR NAMES types/offapi.rdb
    HINTS ${LIBREOFFICE_SDK_DIR}/../program
    PATHS /usr/lib/libreoffice/program /usr/lib64/libreoffice/program /opt/libreoffice/program
    DOC "The program folder of LibreOffice")

set(LibreOfficeSDK_UNOIDL_WRITE ${LIBREOFFICE_SDK_DIR}/bin/unoidl-write)
set(LibreOfficeSDK_CPPUMAKER ${LIBREOFFICE_SDK_DIR}/bin/cppumaker)
set(LibreOfficeSDK_TYPES ${LIBREOFFICE_PROGRAM_DIR}/types.rdb ${LIBREOFFICE_PROGRAM_DIR}/types/offapi.rdb)

set(libraries)
foreach(name IN ITEMS uno_sal uno_cppu uno_cppuhelpergcc3)
    find_library(LibreOfficeSDK_${name} NAMES ${name} HINTS ${LIBREOFFICE_SDK_DIR}/lib NO_DEFAULT_PATH)
    mark_as_advanced(LibreOfficeSDK_${name})
    list(APPEND libraries LibreOfficeSDK_${name})
endforeach()

include(FindPackageHandleStandardArgs)
find_package_handle_standard_args(LibreOfficeSDK
    REQUIRED_VARS LIBREOFFICE_SDK_DIR LIBREOFFICE_PROGRAM_DIR ${libraries}
    REASON_FAILURE_MESSAGE "On Debian: apt-get install libreoffice-calc-nogui libreoffice-dev. Without the extension: -DRANKSTEAD_ADDIN=OFF")

if(LibreOfficeSDK_FOUND AND NOT TARGET LibreOfficeSDK::cppu)
    add_library(LibreOfficeSDK::cppu INTERFACE IMPORTED GLOBAL)
    set_target_properties(LibreOfficeSDK::cppu PROPERTIES
        INTERFACE_INCLUDE_DIRECTORIES ${LIBREOFFICE_SDK_DIR}/include
        INTERFACE_COMPILE_DEFINITIONS "UNX;LINUX;GCC;CPPU_ENV=gcc3;_REENTRANT"
        INTERFACE_LINK_OPTIONS "-Wl,-rpath-link,${LIBREOFFICE_PROGRAM_DIR}"
        INTERFACE_LINK_LIBRARIES
            "${LibreOfficeSDK_uno_cppuhelpergcc3};${LibreOfficeSDK_uno_cppu};${LibreOfficeSDK_uno_sal}")
endif()
