# One link target a folder of the window: cornerwright_window_library(parts SOURCES a.cpp ... DEPENDS widgets ...)
# makes widgets_parts. DEPENDS names link targets.
function(cornerwright_window_library name)
    cmake_parse_arguments(arg "" "" "SOURCES;DEPENDS" ${ARGN})
    add_library(widgets_${name} STATIC ${arg_SOURCES})
    set_target_properties(widgets_${name} PROPERTIES AUTOMOC ON)
    target_include_directories(widgets_${name} PUBLIC ${PROJECT_SOURCE_DIR})
    target_link_libraries(widgets_${name} PUBLIC ${arg_DEPENDS})
endfunction()
